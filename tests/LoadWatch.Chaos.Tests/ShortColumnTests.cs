using LoadWatch.Chaos.Processes;
using LoadWatch.Chaos.Scenarios;

namespace LoadWatch.Chaos.Tests;

/// <summary>
/// The short column of the scenarios that fit into a gate of minutes; with <c>LOADWATCH_CHAOS=all</c> of every scenario, as <c>chaos all</c> runs it.
/// </summary>
public sealed class ShortColumnTests(ITestOutputHelper output)
{
    private const int Seed = 20260615;

    private static readonly string[] Gate =
    [
        "kill-points", "kill-points-rebuild", "random-kills", "same-bytes", "growing-file", "changed-while-read", "two-instances",
        "hostile-names", "unknown-owner", "late-files", "database-damaged", "rotted-original", "mail-refused", "mail-away", "service-sync-fails",
    ];

    public static TheoryData<string> Scenarios => Environment.GetEnvironmentVariable("LOADWATCH_CHAOS") == "all"
        ? [.. Catalogue.All.Select(scenario => scenario.Id)]
        : [.. Gate.Select(id => Catalogue.Find(id).Id)];

    [Theory]
    [MemberData(nameof(Scenarios))]
    public void NothingIsLostAndNothingDoubled(string id)
    {
        var result = Result.Of(Catalogue.Find(id), Binary.Find(), Seed, isLong: false);
        Assert.SkipWhen(result.Skipped is not null, $"{id}: {result.Skipped}");

        output.WriteLine(result.Row());
        Assert.Null(result.Failure);
        Assert.True(result.Trial.Provoked > 0, "nothing was disturbed");
    }
}
