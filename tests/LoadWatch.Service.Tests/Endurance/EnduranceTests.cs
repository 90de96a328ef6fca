namespace LoadWatch.Service.Tests.Endurance;

/// <summary>A service that runs for years holds no more in the second than in the first.</summary>
[Collection(Nightly.Name)]
public sealed class EnduranceTests(NightlyService nights)
{
    private const double Mega = 1024 * 1024;

    [Fact]
    public void TheRegressionFindsAGrowth()
    {
        List<Holding> samples = [new(0, 1, 50, 90, 20, 9), new(50, 2, 50, 90, 22, 9), new(100, 3, 50, 90, 24, 9)];

        Assert.Equal((2, 0, 4), (
            Holding.GrowthPer100Nights(samples, sample => sample.ManagedMegabytes),
            Holding.GrowthPer100Nights(samples, sample => sample.NativeMegabytes!.Value),
            Holding.GrowthPer100Nights(samples, sample => sample.Handles)));
    }

    [Fact]
    public void MemoryHandlesAndThreadsDoNotGrow()
    {
        var growth = new (string What, double Most, double Found)[]
        {
            ("managed MB", 1, Growth(sample => sample.ManagedMegabytes)),
            ("native MB", 1, Growth(sample => sample.NativeMegabytes ?? 0)),
            ("resident MB", 4, Growth(sample => sample.WorkingSetMegabytes)),
            ("handles", 0.5, Growth(sample => sample.Handles)),
            ("threads", 0.5, Growth(sample => sample.Threads)),
        };
        TestContext.Current.TestOutputHelper?.WriteLine(string.Join(", ", growth.Select(one => FormattableString.Invariant($"{one.What} {one.Found:0.000}"))));
        TestContext.Current.TestOutputHelper?.WriteLine(string.Join('\n', nights.Samples));

        Assert.True(nights.Samples.Count > 30);
        Assert.All(growth, one => Assert.True(one.Found < one.Most, FormattableString.Invariant($"{one.What} grow by {one.Found:0.00} per 100 nights")));
    }

    [Fact]
    public void TheWriteAheadLogAndTheServiceLogStaySmall()
    {
        Assert.InRange(nights.LargestWalBytes / Mega, 0.001, 16);
        Assert.InRange(nights.Log.Length / (double)Season.Nights, 1, 2000);
        Assert.DoesNotContain("\"@l\":\"Error\"", nights.Log, StringComparison.Ordinal);
    }

    private double Growth(Func<Holding, double> value) => Holding.GrowthPer100Nights(nights.Samples, value);
}
