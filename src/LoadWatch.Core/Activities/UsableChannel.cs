using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>One channel of a recording after the quality cuts: its usable readings in time order, as columns.</summary>
public sealed class UsableChannel
{
    private readonly long[] times;
    private readonly double[] values;
    private readonly int[] milliseconds;

    /// <param name="samples">Usable readings in time order.</param>
    /// <param name="share">Time of the usable readings over the sampled time, 0 to 1.</param>
    public UsableChannel(Channel channel, IReadOnlyList<UsableSample> samples, double share)
        : this(
            channel,
            [.. samples.Select(sample => sample.UnixMilliseconds)],
            [.. samples.Select(sample => sample.Value)],
            [.. samples.Select(sample => sample.Milliseconds)],
            samples.Count,
            share)
    {
    }

    /// <summary>Takes the columns as they are, which may be those of the recording itself and may be longer than what is usable.</summary>
    internal UsableChannel(Channel channel, long[] times, double[] values, int[] milliseconds, int count, double share)
    {
        this.times = times;
        this.values = values;
        this.milliseconds = milliseconds;
        (Channel, Count, Share) = (channel, count, share);
    }

    public Channel Channel { get; }

    /// <summary>Number of usable readings.</summary>
    public int Count { get; }

    /// <summary>Time of the usable readings over the sampled time: that of all dated rows while the timer ran, 0 to 1.</summary>
    public double Share { get; }

    /// <summary>What of the channel is not usable, by reason, then by time; with <see cref="Share"/> their shares add up to 1.</summary>
    public IReadOnlyList<Cut> Cuts { get; init; } = [];

    /// <summary>When each was taken, milliseconds since 1970-01-01T00:00:00Z.</summary>
    public ReadOnlySpan<long> UnixMilliseconds => times.AsSpan(0, Count);

    /// <summary>In the channel's unit, within <see cref="ChannelLimits"/>.</summary>
    public ReadOnlySpan<double> Values => values.AsSpan(0, Count);

    /// <summary>How long each stands, 0 to <see cref="UsableSamples.LongestMilliseconds"/>.</summary>
    public ReadOnlySpan<int> Milliseconds => milliseconds.AsSpan(0, Count);

    /// <summary>The same one by one, copied.</summary>
    public IReadOnlyList<UsableSample> Samples => [.. Enumerable.Range(0, Count).Select(at => new UsableSample(times[at], values[at], milliseconds[at]))];

    /// <summary>Only those readings that stand for some time.</summary>
    public UsableChannel Held()
    {
        var held = 0;
        foreach (var duration in Milliseconds)
        {
            held += duration > 0 ? 1 : 0;
        }

        // The last stands for none; mostly it is the only one.
        return held == Count - 1 && milliseconds[held] == 0 ? new UsableChannel(Channel, times, values, milliseconds, held, Share) { Cuts = Cuts } : Without0(held);
    }

    private UsableChannel Without0(int held)
    {
        var (heldTimes, heldValues, heldMilliseconds) = (new long[held], new double[held], new int[held]);
        for (int from = 0, to = 0; to < held; from++)
        {
            if (milliseconds[from] > 0)
            {
                (heldTimes[to], heldValues[to], heldMilliseconds[to]) = (times[from], values[from], milliseconds[from]);
                to++;
            }
        }

        return new UsableChannel(Channel, heldTimes, heldValues, heldMilliseconds, held, Share) { Cuts = Cuts };
    }
}

/// <summary>A usable reading and the time that it stands for.</summary>
/// <param name="UnixMilliseconds">Milliseconds since 1970-01-01T00:00:00Z.</param>
/// <param name="Value">In the channel's unit, within <see cref="ChannelLimits"/>.</param>
/// <param name="Milliseconds">0 to <see cref="UsableSamples.LongestMilliseconds"/>.</param>
public readonly record struct UsableSample(long UnixMilliseconds, double Value, int Milliseconds);
