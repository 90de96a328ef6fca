using BenchmarkDotNet.Attributes;
using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.Recordings;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Benchmarks;

/// <summary>One new session of somebody who trained daily for a year, against ten years: days and findings brought up to date in the store, one durable commit.</summary>
[MemoryDiagnoser]
public class NewDayBenchmarks
{
    private static readonly LocalDate Last = new(2026, 6, 13);

    private readonly DirectoryInfo root = Directory.CreateTempSubdirectory("loadwatch-days-");
    private Workplace oneYear = null!;
    private Workplace tenYears = null!;
    private int session;

    [GlobalSetup]
    public void Fill()
    {
        oneYear = Filled("one", 365);
        tenYears = Filled("ten", 3650);
    }

    [GlobalCleanup]
    public void Remove()
    {
        oneYear.Dispose();
        tenYears.Dispose();
        root.Delete(recursive: true);
    }

    [Benchmark(Baseline = true)]
    public void AfterOneYear() => AddOne(oneYear);

    [Benchmark]
    public void AfterTenYears() => AddOne(tenYears);

    /// <summary>Another session of the same date each time: it is the last date that changes.</summary>
    private void AddOne(Workplace workplace)
    {
        session++;
        workplace.Store.Write(store => Put(store, Last, session));
        Update(workplace);
    }

    private Workplace Filled(string name, int days)
    {
        var folder = root.CreateSubdirectory(name);
        File.WriteAllText(Path.Combine(folder.FullName, "loadwatch.json"), """
            {
              "time_zone": "UTC",
              "inboxes": [{ "name": "inbox", "path": "." }],
              "groups": [{ "id": "squad", "name": "Squad" }],
              "contacts": [{ "id": "staff", "name": "Staff", "groups": ["squad"] }]
            }
            """);
        File.WriteAllText(Path.Combine(folder.FullName, "roster.csv"), "person,name,group,birth_year,sex,time_zone\nanna,Anna Ahola,squad,1996,f,UTC\n");
        var workplace = Workplace.OpenToWork(Path.Combine(folder.FullName, "loadwatch.json"));
        workplace.Store.Write(store =>
        {
            for (var day = 1; day <= days; day++)
            {
                Put(store, Last.PlusDays(-day), 0);
            }
        });
        Update(workplace);
        return workplace;
    }

    private static void Put(StoreSession store, LocalDate date, int order)
    {
        var sha = $"{date:uuuuMMdd}{order:x8}".PadLeft(64, '0');
        store.Arrivals.AddWaiting(sha, null, sha, 1);
        var summary = new RecordingSummary(
            sha, 1, "anna", (date + new LocalTime(9, 0)).InUtc().ToInstant(), Offset.Zero, new Sport("cycling"), 3600, 3600, "device 255/1/7", new ChannelExtents([]), 3600, 0, order);
        store.Recordings.Add(summary);
        store.Activities.Put(new StoredActivity(
            summary, new ActivityValues { Quantities = [new Quantity(QuantityNames.BanisterTrimp, 60 + (date.Day * 2), "AU", Estimated: false)] }));
        store.People.MarkDirty("anna", date);
    }

    private static void Update(Workplace workplace) =>
        new DayUpdate(workplace.Configuration, workplace.Store, (Last.PlusDays(1) + new LocalTime(6, 0)).InUtc().ToInstant(), new SweepReport()).Run(CancellationToken.None);
}
