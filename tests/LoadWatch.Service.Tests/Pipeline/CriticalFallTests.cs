using LoadWatch.Decoding.Fit;
using LoadWatch.Findings;
using LoadWatch.Service.Explain;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Bests reach the rule of falling capacity from stored activities: 16 weeks of rides with efforts on W = 18 kJ + CP t, of 250 W and then of 225 W.</summary>
public sealed class CriticalFallTests : IDisposable
{
    private static readonly LocalDate Last = new(2026, 6, 14);
    private static readonly int[] Efforts = [120, 300, 720];

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AFallOfStoredBestsIsTold()
    {
        folder.Fill(Season());
        folder.Sweep();

        var finding = Assert.Single(Findings(), one => one.Date == Last);
        Assert.Equal(("critical_power", 10), (finding.Quantity, Math.Round(finding.Value, 3)));
        Assert.Contains("10 % below the 250 W (standard error 5 W) of the weeks before", finding.Text);
        Assert.Contains("critical power of late below the value before", folder.Brief());
    }

    [Fact]
    public void ExplainShowsBothValuesOrWhyTheyAreNotCompared()
    {
        folder.Fill(Season());
        folder.Sweep();

        Assert.Contains("critical power: 225 W of late, 250 W before (cycling), 10 % below (limit 5.4 %)", Explained(Last));
        Assert.Contains("critical_power_before = 250 W", Explained(Last));
        Assert.Contains("Monod and Scherrer 1965", Explained(Last));
        Assert.Contains("critical power: not compared: 2025-12-22 to 2026-02-15: no session with an unbroken stretch of 2 minutes or more", Explained(new LocalDate(2026, 4, 12)));
    }

    [Fact]
    public void NightByNightAndRebuiltTheyAreTheSame()
    {
        folder.Fill(Season());
        folder.Sweep();
        using var other = new WorkingFolder();
        var season = Season();
        for (var night = 0; night < 4; night++)
        {
            other.Fill(season.Where((_, index) => index % 4 == night));
            other.Sweep(WorkingFolder.Now - Duration.FromDays(3 - night));
        }

        Assert.Equal(folder.Export("findings"), other.Export("findings"));
        folder.Rebuild();
        Assert.Equal(other.Export("findings"), folder.Export("findings"));
    }

    private static IReadOnlyList<(string Path, byte[] Bytes)> Season() =>
    [
        .. Enumerable.Range(0, 16).Where(week => week % 2 == 1)
            .SelectMany(week => Efforts.Select((seconds, order) => (Date: Last.PlusDays((7 * (week - 15)) - 2 + order), Seconds: seconds)))
            .Select(effort => ($"anna/{effort.Date:uuuuMMdd}.fit", Ride(effort.Date, effort.Seconds, effort.Date > Last.PlusDays(-56) ? 225 : 250))),
    ];

    /// <summary>25 minutes at 100 W, of which the first after 5 minutes as hard as can be for so long.</summary>
    private static byte[] Ride(LocalDate date, int seconds, int critical)
    {
        var ride = Some.Ride(date);
        return FitEncoder.Encode(ride with
        {
            Samples = [.. Enumerable.Range(0, 1501).Select(second => new FitSample(
                ride.Start + Duration.FromSeconds(second),
                Power: second >= 300 && second < 300 + seconds ? critical + (18_000 / seconds) : 100,
                Distance: 8.0 * second,
                HeartRate: second >= 300 && second < 300 + seconds ? 170 + (second % 7) : 110 + (second % 9)))],
        });
    }

    private IReadOnlyList<Finding> Findings() => folder.Read((_, session) => session.Findings.OfPerson("anna", LocalDate.MinIsoValue, LocalDate.MaxIsoValue))
        .Where(finding => finding.Rule == FallingCapacityRule.Word).ToList();

    private string Explained(LocalDate date) => folder.Read((workplace, session) => FindingExplanation.Of(workplace.Configuration, session, "anna", FallingCapacityRule.Word, date))!;
}
