using LoadWatch.Recordings;

namespace LoadWatch.Quality;

public class FlatLineTests
{
    private static readonly double[] Varied = [.. Enumerable.Range(0, 400).Select(second => second / 20 % 2 == 0 ? 100.0 : 200)];

    [Theory]
    [InlineData(Channel.Power, 1)]
    [InlineData(Channel.Speed, 0.02)]
    public void AHeartRateThatStandsStillWhileTheLoadVariesIsCut(Channel channel, double perWatt)
    {
        var cut = Assert.Single(Cuts((channel, [.. Varied.Select(watts => watts * perWatt)]), [.. Walk(100), (171, 100), .. Walk(199)]));

        Assert.Equal((Channel.HeartRate, CutReason.FlatLine, 100.0, 200.0, 100), (cut.Channel, cut.Reason, cut.From(), cut.To(), cut.Readings));
    }

    [Fact]
    public void UnderASteadyLoadItMayStandStill() => Assert.Empty(Cuts((Channel.Power, Given.Steps((200, 399))), (150, 399)));

    /// <summary>Noise of single readings is no change of the load: a block of 15 s has the same mean as the next.</summary>
    [Fact]
    public void NoiseIsNoChangeOfTheLoad() =>
        Assert.Empty(Cuts((Channel.Power, [.. Enumerable.Range(0, 400).Select(second => second % 5 == 0 ? 400.0 : 150)]), (150, 399)));

    [Theory]
    [InlineData(61, 0)]
    [InlineData(62, 1)]
    public void AMinuteIsNoFlatLineYet(int seconds, int cuts) => Assert.Equal(cuts, Cuts((Channel.Power, Varied), [.. Walk(100), (171, seconds), .. Walk(399 - 100 - seconds)]).Count);

    [Fact]
    public void WithoutALoadToHoldItAgainstItStays() => Assert.Empty(Judging.Cuts("cycling", (Channel.HeartRate, Given.Steps((150, 300)))));

    private static IReadOnlyList<Cut> Cuts((Channel, double[]) load, params (double, int)[] heartRate) =>
        Judging.Cuts("cycling", load, (Channel.HeartRate, Given.Steps(heartRate)));

    private static IEnumerable<(double, int)> Walk(int seconds) => Enumerable.Range(0, seconds).Select(second => (165.0 + (second % 5), 1));
}
