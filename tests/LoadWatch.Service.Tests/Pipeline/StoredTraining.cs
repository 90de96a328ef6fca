using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Puts computed sessions and rows into a store as intake does, without files, and brings the days up to date.</summary>
internal static class StoredTraining
{
    public static void Put(StoreSession session, string person, LocalDate date, double load) =>
        Put(session, person, date, new ActivityValues { Quantities = [new Quantity(QuantityNames.BanisterTrimp, Significant.Round(load), "AU", Estimated: false)] });

    /// <summary>With a histogram of heart rate, and the loads that it tells by the reference values of the date.</summary>
    public static void Put(StoreSession session, Person person, AnchorBook anchors, LocalDate date, double minutes)
    {
        var heartRate = RandomReferences.HeartRate(minutes, 120 + date.Day);
        Put(session, person.Id, date, new ActivityValues
        {
            Quantities = [.. HeartRateLoads.Of(heartRate, date, person, anchors, new()).Quantities.OrderBy(quantity => quantity.Name, StringComparer.Ordinal)],
            Histograms = new Dictionary<Channel, Histogram> { [Channel.HeartRate] = heartRate },
        });
    }

    private static void Put(StoreSession session, string person, LocalDate date, ActivityValues values)
    {
        var sha = $"{date:uuuuMMdd}".PadLeft(64, 'a');
        session.Arrivals.AddWaiting(sha, null, sha, 1);
        var summary = new RecordingSummary(
            sha, 1, person, (date + new LocalTime(9, 0)).InUtc().ToInstant(), Offset.Zero, new Sport("cycling"), 3600, 3600, "device 255/1/7", new ChannelExtents([]), 3600, 0, date.Day);
        session.Recordings.Add(summary);
        session.Activities.Put(new StoredActivity(summary, values));
        session.People.MarkDirty(person, date);
    }

    public static void Put(StoreSession session, string person, RowKind kind, LocalDate date, RowContent content, string scope = "inbox/table.csv")
    {
        var owner = kind == RowKind.Plan ? null : person;
        session.TableRows.Put([new StoredRow(scope, kind, $"own {kind}", owner ?? "squad", owner, date, $"{date:uuuu-MM-dd} {kind} {scope}", WorkingFolder.Now, content)]);
        session.People.MarkDirty(person, date);
    }

    /// <returns>Rows read for it.</returns>
    public static long Update(WorkingConfiguration configuration, Store store, LocalDate through)
    {
        var before = store.RowsRead;
        new DayUpdate(configuration, store, (through.PlusDays(1) + new LocalTime(6, 0)).InUtc().ToInstant(), new SweepReport()).Run(CancellationToken.None);
        return store.RowsRead - before;
    }
}
