using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class AccelerationsTests
{
    /// <summary>
    /// By hand, ten readings a second: on a straight ramp the slope is that of the ramp once the two readings before and the two after lie on it. Of the
    /// n + 1 readings of a ramp of n tenths that are n - 3, of 0.1 s each; the ones beside them are at 0.8 of the slope, 2.4 m/s2. So 0.5 s are held by a
    /// ramp of 0.8 s, not by one of 0.7 s.
    /// </summary>
    [Theory]
    [InlineData(7, 0)]
    [InlineData(8, 1)]
    [InlineData(20, 1)]
    public void AtTenReadingsASecondItIsHeldForHalfASecond(int tenths, int count) =>
        Assert.Equal((count, 0), Of(100, Ramp(Flat(0), (tenths, 0.3))));

    /// <summary>By hand, five a second: the slope is right once one reading before and one after lie on the ramp: n - 1 readings of 0.2 s, the ones
    /// beside them at half of the slope. So 1 s is held by a ramp of 1.2 s, not by one of 1 s.</summary>
    [Theory]
    [InlineData(5, 0)]
    [InlineData(6, 1)]
    public void AtFiveReadingsASecondItIsHeldForASecond(int fifths, int count) =>
        Assert.Equal((count, 0), Of(200, Ramp(Flat(0), (fifths, 0.6))));

    [Theory]
    [InlineData(0.25, 1)]
    [InlineData(0.249, 0)]
    public void TheBoundItselfIsHigh(double perTenth, int count) => Assert.Equal((count, 0), Of(100, Ramp(Flat(0), (20, perTenth))));

    [Fact]
    public void SlowingDownCountsApart() => Assert.Equal((1, 2), Of(100, Ramp(Flat(7), (15, -0.3), (5, 0), (10, 0.4), (5, 0), (12, -0.3))));

    [Fact]
    public void OneEffortCountsOnceUntilTheChangeIsBackToZero()
    {
        Assert.Equal((1, 0), Of(100, Ramp(Flat(0), (10, 0.3), (10, 0.05), (10, 0.3))));
        Assert.Equal((2, 0), Of(100, Ramp(Flat(0), (10, 0.3), (10, 0), (10, 0.3))));
    }

    [Theory]
    [InlineData(201)]
    [InlineData(1000)]
    public void AtFewerThanFiveReadingsASecondTheyAreUnknown(int step) => Assert.Null(Of(step, Ramp(Flat(0), (3, 3))));

    [Fact]
    public void WithoutReadingsTheyAreUnknown() => Assert.Null(Accelerations.Of(new UsableChannel(Channel.Speed, [], 1)));

    /// <summary>By hand: 2 s without a reading cut the 0.9 s that are held into 0.4 s before, its last reading standing for no known time, and 0.4 s
    /// after.</summary>
    [Fact]
    public void NothingIsHeldOverAGap()
    {
        var speeds = Ramp(Flat(0), (12, 0.3));
        long[] times = [.. speeds.Select((_, at) => (at * 100L) + (at > 15 ? 2000 : 0))];

        Assert.Equal((0, 0), Of(times, speeds));
        Assert.Equal((1, 0), Of(100, speeds));
    }

    [Fact]
    public void OfReadingsOfOneMomentTheLastCounts()
    {
        var speeds = Ramp(Flat(0), (8, 0.3));
        long[] times = [.. speeds.SelectMany((_, at) => new[] { at * 100L, at * 100L })];

        Assert.Equal((1, 0), Of(times, [.. speeds.SelectMany(speed => new[] { 13 - speed, speed })]));
    }

    [Fact]
    public void MirroredSpeedsSwapTheCounts() =>
        Gen.Select(Gen.Int[-40, 40].Array[1, 20], Gen.Int[1, 15]).Sample((slopes, steps) =>
        {
            var speeds = Ramp(Flat(5), [.. slopes.Select(slope => (steps, slope / 100.0))]);
            var (rises, falls) = Of(100, speeds)!.Value;
            return Of(100, [.. speeds.Select(speed => 10 - speed)]) == (falls, rises);
        });

    [Fact]
    public void AnyLevelSpeedHasNone() =>
        Gen.Select(Gen.Double[0, 13], Gen.Int[20, 200]).Sample((speed, step) => Of(step, [.. Enumerable.Repeat(speed, 40)]) == (0, 0));

    private static double[] Flat(double speed) => [.. Enumerable.Repeat(speed, 10)];

    /// <summary>Straight pieces of so many steps of so much each, after a stretch that ends at <paramref name="before"/>, and 1 s at the last speed.</summary>
    private static double[] Ramp(double[] before, params (int Steps, double Change)[] pieces)
    {
        List<double> speeds = [.. before];
        foreach (var (steps, change) in pieces)
        {
            var start = speeds[^1];
            speeds.AddRange(Enumerable.Range(1, steps).Select(step => start + (step * change)));
        }

        return [.. speeds, .. Flat(speeds[^1])];
    }

    private static (int Accelerations, int Decelerations)? Of(int step, double[] speeds) =>
        Of([.. Enumerable.Range(0, speeds.Length).Select(at => at * (long)step)], speeds);

    /// <summary>A reading stands for the time to the next one, the last for 0, as in a recording.</summary>
    private static (int Accelerations, int Decelerations)? Of(long[] times, double[] speeds) => Accelerations.Of(new UsableChannel(
        Channel.Speed,
        [.. speeds.Select((speed, at) => new UsableSample(times[at], speed, at == speeds.Length - 1 ? 0 : (int)(times[at + 1] - times[at])))],
        1));
}
