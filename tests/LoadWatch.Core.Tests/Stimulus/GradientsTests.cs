using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class GradientsTests
{
    /// <summary>By hand: 4 m/s for 10 min, 0.2 m up a second.</summary>
    [Fact]
    public void AnEvenClimbHasOneGradientFromEndToEnd() =>
        Assert.All(Along(Steps(4, 600), second => second * 0.2)[..^2], gradient => Assert.Equal(0.05, gradient, 1e-9));

    /// <summary>Steps of a barometer, 0.6 m up and down from reading to reading, come to nothing.</summary>
    [Fact]
    public void NoiseOfTheHeightIsSmoothedAway() =>
        Assert.All(Along(Steps(4, 600), second => second % 2 * 0.6)[20..^20], gradient => Assert.Equal(0, gradient, 0.002));

    [Fact]
    public void StandingStillHasNoGradient() => Assert.All(Along(Steps(0, 60), second => second), gradient => Assert.Equal(0, gradient));

    [Fact]
    public void WithoutHeightsTheWayReadsAsLevel()
    {
        var none = new UsableChannel(Channel.Altitude, [new(Given.StartMilliseconds - 60_000, 500, 10_000)], 1);
        var gradients = new double[61];
        Gradients.Along(new UsableChannel(Channel.Speed, Steps(4, 60), 1), none, gradients);

        Assert.All(gradients, gradient => Assert.Equal(0, gradient));
    }

    /// <summary>Driven 300 m up in a pause: no gradient reaches across it.</summary>
    [Fact]
    public void ALiftWhileNothingWasRecordedIsNoSlope()
    {
        UsableSample[] speed = [.. Steps(4, 100), .. Steps(4, 100).Select(one => one with { UnixMilliseconds = one.UnixMilliseconds + 900_000 })];
        var heights = speed.Select((one, at) => one with { Value = at > 100 ? 800 : 500 }).ToArray();
        var gradients = new double[speed.Length];
        Gradients.Along(new UsableChannel(Channel.Speed, speed, 1), new UsableChannel(Channel.Altitude, heights, 1), gradients);

        Assert.All(gradients, gradient => Assert.Equal(0, gradient, 1e-9));
    }

    /// <summary>What is left of sums that came and went is rounding, and no height: over the gap the way reads as level.</summary>
    [Fact]
    public void AGapOfTheHeightAfterUnevenGroundIsLevelAndNeverUnreadable()
    {
        var speed = Steps(3.3, 600);
        var heights = speed.Where((_, second) => second is < 300 or > 390).Select((one, at) => one with { Value = 503.7 + (7.1 * Math.Sin(at * 0.37)) + (0.1 * at) }).ToArray();
        var gradients = new double[speed.Length];
        Gradients.Along(new UsableChannel(Channel.Speed, speed, 1), new UsableChannel(Channel.Altitude, heights, 1), gradients);

        Assert.All(gradients, gradient => Assert.True(double.IsFinite(gradient)));
        Assert.All(gradients[340..350], gradient => Assert.Equal(0, gradient));
    }

    private static double[] Along(UsableSample[] speed, Func<int, double> height)
    {
        var heights = speed.Select((one, second) => one with { Value = 500 + height(second) }).ToArray();
        var gradients = new double[speed.Length];
        Gradients.Along(new UsableChannel(Channel.Speed, speed, 1), new UsableChannel(Channel.Altitude, heights, 1), gradients);
        return gradients;
    }

    private static UsableSample[] Steps(double metresPerSecond, int seconds) => Given.Samples((metresPerSecond, seconds));
}
