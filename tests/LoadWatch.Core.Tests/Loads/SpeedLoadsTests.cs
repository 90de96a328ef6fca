using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class SpeedLoadsTests
{
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

    /// <summary>By hand: 80 and 90 % of 7.5 m/s are 6 and 6.75 m/s; in the middles of the bins 100.75 m and 40.25 m; 8 / 7.5 = 1.0666...</summary>
    [Fact]
    public void WithABestSpeedTheSharesJoin() =>
        Assert.Equal(
            [
                new Quantity("speed_top", 8, "m/s", Estimated: false),
                new Quantity("distance_above_5_5_m_s", 100.75, "m", Estimated: false),
                new Quantity("distance_above_7_m_s", 40.25, "m", Estimated: false),
                new Quantity("speed_top_share", 1.06666667, "1", Estimated: false),
                new Quantity("distance_above_80_percent_speed_max", 100.75, "m", Estimated: false),
                new Quantity("distance_above_90_percent_speed_max", 40.25, "m", Estimated: false),
            ],
            Of("soccer", Samples, Given.Anchor(AnchorKind.SpeedMax, 7.5)));

    [Fact]
    public void OnWheelsABestSpeedOnFootMeansNothing() => Assert.Empty(Of("cycling", Samples, Given.Anchor(AnchorKind.SpeedMax, 7.5)));

    [Fact]
    public void TenReadingsASecondCountAccelerationsToo()
    {
        var times = Enumerable.Range(0, 31).Select(at => Given.StartMilliseconds + (at * 100L)).ToArray();
        var samples = new SampleSeries(times, new Dictionary<Channel, double[]> { [Channel.Speed] = [.. Enumerable.Repeat(3.0, 31)] });

        Assert.Equal(
            [new Quantity("accelerations", 0, "count", Estimated: false), new Quantity("decelerations", 0, "count", Estimated: false)],
            Of("soccer", samples).TakeLast(2));
        Assert.Empty(Of("cycling", samples));
    }

    private static IEnumerable<Quantity> Of(string sport, SampleSeries samples, Anchor? best = null)
    {
        var usable = new UsableRecording(Given.Recording(sport, samples), shareWanted: 0.5);
        var ofSamples = SpeedLoads.OfSamples(usable);
        var top = ofSamples.FirstOrDefault(quantity => quantity.Name == QuantityNames.SpeedTop)?.Value;
        var ofHistogram = SpeedLoads.OfHistogram(
            usable.Histograms.GetValueOrDefault(Channel.Speed), usable.Recording.Sport, top, best, new ComputationSettings());
        return [.. ofSamples.Take(1), .. ofHistogram, .. ofSamples.Skip(1)];
    }
}
