using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class UncoveredTimeTests
{
    [Fact]
    public void WhereTheBetterChannelIsThereNothingIsLeft() => Assert.Equal([0, 0, 0], Left([(0, 1000), (1000, 1000), (2000, 0)], [(0, 1000), (1000, 1000), (2000, 0)]));

    /// <summary>By hand: the better one stands from 1.5 to 3 s and from 6 to 7 s.</summary>
    [Fact]
    public void WhatTheBetterOneLeavesCountsToTheMillisecond() => Assert.Equal(
        [1000, 500, 0, 2000, 3000],
        Left([(0, 1000), (1000, 1000), (2000, 1000), (3000, 2000), (5000, 4000)], [(1500, 1500), (6000, 1000)]));

    [Fact]
    public void WithoutTheBetterOneAllIsLeft() => Assert.Equal([1000, 1000], Left([(0, 1000), (1000, 1000)], []));

    private static int[] Left((long At, int Milliseconds)[] channel, (long At, int Milliseconds)[] better)
    {
        var left = new int[channel.Length];
        var sum = UncoveredTime.Of(Of(channel), Of(better), left);

        Assert.Equal(left.Sum(), sum);
        return left;
    }

    private static UsableChannel Of((long At, int Milliseconds)[] readings) =>
        new(Channel.HeartRate, [.. readings.Select(one => new UsableSample(one.At, 100, one.Milliseconds))], 1);
}
