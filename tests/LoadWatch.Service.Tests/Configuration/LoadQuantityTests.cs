using LoadWatch.Service.Commands;
using NodaTime;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class LoadQuantityTests
{
    private static readonly LocalDate First = new(2026, 3, 2);

    /// <summary>Four weeks of half an hour a day and one of an hour and a half: 630 min against a usual week of 210 min, three times as much.</summary>
    [Fact]
    public void AFindingSpeaksInTheUnitOfTheGroupsOwnLoad()
    {
        using var folder = new ConfigurationFolder();
        folder.Write("loadwatch.json", """
            { "time_zone": "UTC", "intake": { "settle_seconds": 0 }, "groups": [ { "id": "squad", "load_quantity": "minutes" } ] }
            """);
        Directory.CreateDirectory(folder.At("inbox/anna"));
        for (var day = 0; day < 35; day++)
        {
            folder.Write($"inbox/anna/{day}.csv", Session(First.PlusDays(day), day < 28 ? "10:30" : "11:30"));
        }

        using var workplace = Workplace.OpenToWork(folder.At("loadwatch.json"));
        workplace.NewSweep(First.PlusDays(35).AtMidnight().InUtc().ToInstant() + Duration.FromHours(5)).Run(TestContext.Current.CancellationToken);
        var last = First.PlusDays(34);
        var findings = workplace.Store.Read(session => session.Findings.OfPerson("anna", last, last));

        var sentence = Assert.Single(findings, finding => finding.Rule == "load_ratio").Text;
        Assert.Contains("3.0 times the usual week (630 against 210 min)", sentence, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("distance_above_7_m_s", "[2, 4, 5.5, 7]")]
    [InlineData("distance_above_6_25_m_s", "[2, 6.25]")]
    public void AFastDistanceMayBeTheLoadWhereItsBoundIsOneOfTheSpeedZones(string quantity, string bounds)
    {
        var read = ConfigurationFolder.With(
            "loadwatch.json",
            $$"""{ "groups": [ { "id": "squad", "load_quantity": "{{quantity}}" } ], "computation": { "speed_bounds": {{bounds}} } }""");

        Assert.Equal(quantity, read.Groups["squad"].LoadQuantity);
    }

    [Fact]
    public void ADistanceAboveAShareOfTheBestSpeedMayBeTheLoad()
    {
        var read = ConfigurationFolder.With(
            "loadwatch.json",
            """{ "groups": [ { "id": "squad", "load_quantity": "distance_above_85_percent_speed_max" } ], "computation": { "speed_max_shares": [0.5, 0.85, 1] } }""");

        Assert.Equal("distance_above_85_percent_speed_max", read.Groups["squad"].LoadQuantity);
        Assert.Equal([0.5, 0.85, 1], read.Computation.SpeedMaxShares);
    }

    [Fact]
    public void TheFallbacksOfALoadKeepTheirOrder()
    {
        var read = ConfigurationFolder.With(
            "loadwatch.json", """{ "groups": [ { "id": "squad", "load_fallbacks": ["minutes", "foster_load"] } ] }""");

        Assert.Equal(["minutes", "foster_load"], read.Groups["squad"].LoadFallbacks);
    }

    /// <summary>The highest speed of a day is not the sum of the highest speeds of its sessions.</summary>
    [Fact]
    public void TheTopSpeedIsNoLoad() => Assert.StartsWith(
        "loadwatch.json:1: groups[0].load_quantity: \"speed_top\" is not a quantity",
        Assert.Single(ConfigurationFolder.FaultsWith("loadwatch.json", """{ "groups": [ { "load_quantity": "speed_top" } ] }""")),
        StringComparison.Ordinal);

    private static string Session(LocalDate date, string until) =>
        FormattableString.Invariant($"time,heart_rate_bpm\n{date:uuuu-MM-dd}T10:00:00Z,120\n{date:uuuu-MM-dd}T{until}:00Z,121\n");
}
