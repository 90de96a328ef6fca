using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>From when to when a recording holds usable readings of a channel.</summary>
/// <param name="IsUsable">Whether enough of it is usable (<see cref="ComputationSettings.UsableShareWanted"/>).</param>
/// <param name="First">Earliest usable reading, milliseconds since 1970-01-01T00:00:00Z; null where none is usable.</param>
/// <param name="Last">Latest usable reading, likewise.</param>
public sealed record ChannelExtent(Channel Channel, bool IsUsable, long? First, long? Last);

/// <summary>The channels that hold readings, in the order of <see cref="Channel"/>. Equal by content.</summary>
public sealed class ChannelExtents(IEnumerable<ChannelExtent> extents) : IEquatable<ChannelExtents>
{
    private readonly ChannelExtent[] all = [.. extents.OrderBy(extent => extent.Channel)];

    public static ChannelExtents None { get; } = new([]);

    public IReadOnlyList<ChannelExtent> All => all;

    public int Count => all.Length;

    public int UsableCount => all.Count(extent => extent.IsUsable);

    /// <summary>Latest usable reading of any channel, milliseconds since 1970-01-01T00:00:00Z; null without one.</summary>
    public long? Last => all.Max(extent => extent.Last);

    /// <summary>Null where the recording holds no reading of the channel.</summary>
    public ChannelExtent? this[Channel channel] => Array.Find(all, extent => extent.Channel == channel);

    public static ChannelExtents Of(UsableRecording usable) => new(usable.Channels.Values.Select(channel => new ChannelExtent(
        channel.Channel,
        usable[channel.Channel] is not null,
        channel.Count > 0 ? channel.UnixMilliseconds[0] : null,
        channel.Count > 0 ? channel.UnixMilliseconds[^1] : null)));

    public bool Equals(ChannelExtents? other) => other is not null && all.AsSpan().SequenceEqual(other.all);

    public override bool Equals(object? obj) => Equals(obj as ChannelExtents);

    public override int GetHashCode() => all.Aggregate(all.Length, HashCode.Combine);
}
