using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class SpeedLoadsTests
{
    private static readonly double[] Bounds = [2, 4, 5.5, 7];

    private static readonly SampleSeries Samples = Given.EverySecond((Channel.Speed, Given.Steps((3, 60), (6, 10), (8, 5), (3, 10))));

    /// <summary>By hand, in the middles of the bins: 10 x 6.05 + 5 x 8.05 = 100.75 m, of which 40.25 m at 7 m/s or faster.</summary>
    [Theory]
    [InlineData("running")]
    [InlineData("walking")]
    [InlineData("soccer")]
    [InlineData("hockey")]
    [InlineData("team_sport")]
    public void ASportOnFootHasItsFastDistancesAndItsTop(string sport) =>
        Assert.Equal(
            [
                new Quantity("speed_top", 8, "m/s", Estimated: false),
                new Quantity("distance_above_5_5_m_s", 100.75, "m", Estimated: false),
                new Quantity("distance_above_7_m_s", 40.25, "m", Estimated: false),
            ],
            Of(sport, Samples));

    [Theory]
    [InlineData("cycling")]
    [InlineData("rowing")]
    [InlineData("alpine_skiing")]
    [InlineData("generic")]
    public void OnWheelsWaterOrSnowAndInAnUnnamedSportThereAreNone(string sport) => Assert.Empty(Of(sport, Samples));

    [Fact]
    public void TooFewUsableReadingsGiveNone() =>
        Assert.Empty(Of("running", Given.EverySecond((Channel.Speed, Given.Steps((6, 10), (double.NaN, 30))))));

    [Fact]
    public void ASlowRunHasNoMetresAboveNotUnknownOnes() =>
        Assert.Equal([3.0, 0, 0], Of("running", Given.EverySecond((Channel.Speed, Given.Steps((3, 60))))).Select(quantity => quantity.Value));

    private static IEnumerable<Quantity> Of(string sport, SampleSeries samples) =>
        SpeedLoads.Of(new UsableRecording(Given.Recording(sport, samples), shareWanted: 0.5), Bounds);
}
