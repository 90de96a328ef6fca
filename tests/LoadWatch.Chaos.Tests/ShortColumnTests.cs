using LoadWatch.Chaos.Processes;
using LoadWatch.Chaos.Scenarios;

namespace LoadWatch.Chaos.Tests;

/// <summary>The short column of every scenario, as <c>chaos all</c> runs it.</summary>
public sealed class ShortColumnTests(ITestOutputHelper output)
{
    private const int Seed = 20260615;

    public static TheoryData<string> Scenarios => [.. Catalogue.All.Select(scenario => scenario.Id)];

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
