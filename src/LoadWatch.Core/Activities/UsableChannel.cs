using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>One channel of a recording after the quality cuts.</summary>
/// <param name="Samples">Usable readings in time order.</param>
/// <param name="Share">Time of the usable readings over the time of all dated rows, 0 to 1.</param>
public sealed record UsableChannel(Channel Channel, IReadOnlyList<UsableSample> Samples, double Share);

/// <summary>A usable reading and the time that it stands for.</summary>
/// <param name="UnixMilliseconds">Milliseconds since 1970-01-01T00:00:00Z.</param>
/// <param name="Value">In the channel's unit, within <see cref="ChannelLimits"/>.</param>
/// <param name="Milliseconds">0 to <see cref="UsableSamples.LongestMilliseconds"/>.</param>
public readonly record struct UsableSample(long UnixMilliseconds, double Value, int Milliseconds)
{
    public double Seconds => Milliseconds / 1000.0;
}
