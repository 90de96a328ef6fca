using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Capacity;

public class BestMeansTests
{
    /// <summary>By hand: 10 s at 400 W amid 200 W; of 20 s half at each, of 60 s (4000 + 50 x 200) / 60.</summary>
    [Fact]
    public void EachDurationHasItsOwnBest()
    {
        var means = Of((200, 100), (400, 10), (200, 100));

        Assert.Equal((400, 400, 300, 233.333333), (means[1], means[10], means[20], means[60]));
        Assert.Equal(200 + (2000 / 180.0), means[180]!.Value, 6);
        Assert.Null(means[240]);
        Assert.Null(means[7]);
    }

    [Fact]
    public void AGapIsNotBridged()
    {
        UsableSample[] samples = [.. Row(0, 30, 300), .. Row(40, 30, 300)];

        var means = BestMeans.Of(new UsableChannel(Channel.Power, samples, 1));

        Assert.Equal((300, (double?)null), (means[30], means[40]));
    }

    /// <summary>By hand: 100 W for 3 s, 400 W for 2 s, 100 W for 5 s; best 1 s 400, 2 s 400, 4 s (800 + 200) / 4.</summary>
    [Fact]
    public void AReadingStandsForItsTime()
    {
        UsableSample[] samples = [new(0, 100, 3000), new(3000, 400, 2000), new(5000, 100, 5000), new(10_000, 100, 0)];

        var means = BestMeans.Of(new UsableChannel(Channel.Power, samples, 1));

        Assert.Equal((400, 400, 250), (means[1], means[2], means[4]));
        Assert.Equal(160, means[10]);
    }

    /// <summary>By hand: 1.2 s at 9 m/s from 0.5 s on, else 4 m/s; the best second lies within it, of two seconds 1.2 s do.</summary>
    [Fact]
    public void TenReadingsASecondAreReadToTheTenth()
    {
        double[] speeds = [.. Enumerable.Repeat(4.0, 5), .. Enumerable.Repeat(9.0, 12), .. Enumerable.Repeat(4.0, 40)];
        UsableSample[] samples = [.. speeds.Select((speed, at) => new UsableSample(at * 100L, speed, 100))];

        var means = BestMeans.Of(new UsableChannel(Channel.Speed, samples, 1));

        Assert.Equal((9, 7), (means[1], means[2]));
    }

    [Fact]
    public void NothingUsableHasNoMeans()
    {
        Assert.Empty(BestMeans.Of(new UsableChannel(Channel.Power, [], 0)).Values);
        Assert.Empty(BestMeans.Of(new UsableChannel(Channel.Power, [new(0, 300, 900), new(950, 300, 900)], 1)).Values);
    }

    /// <summary>Against every window of whole seconds, added up one by one.</summary>
    [Fact]
    public void TheyAreThoseOfEveryWindow() => Gen.Int[0, 1200].Array[1, 90].Sample(watts =>
    {
        var means = OfSeconds(watts);

        foreach (var seconds in BestMeans.Durations)
        {
            var windows = Enumerable.Range(0, Math.Max(0, watts.Length - seconds + 1)).Select(at => watts.Skip(at).Take(seconds).Average()).ToList();
            Assert.Equal(windows.Count == 0 ? null : Significant.Round(windows.Max()), means[seconds]);
        }
    });

    [Fact]
    public void MoreWorkNeverLowersABest() => Gen.Select(Gen.Int[0, 900].Array[5, 80], Gen.Int[0, 79], Gen.Int[1, 300]).Sample((watts, second, more) =>
    {
        var before = OfSeconds(watts);
        var after = OfSeconds([.. watts.Select((value, at) => at == second ? value + more : value)]);

        Assert.Equal(before.Values.Count, after.Values.Count);
        Assert.All(before.Values.Zip(after.Values), pair => Assert.True(pair.Second >= pair.First));
    });

    [Fact]
    public void TimeAddedInFrontOrBehindNeverLowersABest() => Gen.Select(Gen.Int[0, 900].Array[5, 80], Gen.Int[0, 900].Array[0, 20], Gen.Int[0, 900].Array[0, 20]).Sample((watts, front, behind) =>
    {
        var (before, after) = (OfSeconds(watts), OfSeconds([.. front, .. watts, .. behind]));

        Assert.All(before.Values.Zip(after.Values), pair => Assert.True(pair.Second >= pair.First));
    });

    private static BestMeans Of(params (double Value, int Seconds)[] steps) => BestMeans.Of(new UsableChannel(Channel.Power, Given.Samples(steps), 1));

    private static BestMeans OfSeconds(int[] watts) => BestMeans.Of(new UsableChannel(Channel.Power, [.. Row(0, watts)], 1));

    private static IEnumerable<UsableSample> Row(int from, int seconds, double watts) => Row(from, [.. Enumerable.Repeat((int)watts, seconds)]);

    private static IEnumerable<UsableSample> Row(int from, int[] watts) => watts.Select((value, at) => new UsableSample((from + at) * 1000L, value, 1000));
}
