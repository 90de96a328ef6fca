using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>Readings of one channel in time order, as columns of one length.</summary>
internal readonly ref struct Readings(ReadOnlySpan<long> unixMilliseconds, ReadOnlySpan<double> values, ReadOnlySpan<int> milliseconds)
{
    public Readings(UsableChannel channel)
        : this(channel.UnixMilliseconds, channel.Values, channel.Milliseconds)
    {
    }

    public ReadOnlySpan<long> UnixMilliseconds { get; } = unixMilliseconds;

    /// <summary>In the channel's unit.</summary>
    public ReadOnlySpan<double> Values { get; } = values;

    /// <summary>How long each stands.</summary>
    public ReadOnlySpan<int> Milliseconds { get; } = milliseconds;
}
