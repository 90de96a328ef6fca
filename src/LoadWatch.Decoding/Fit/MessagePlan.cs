namespace LoadWatch.Decoding.Fit;

/// <summary>A definition made ready for its messages: lengths summed, places looked up.</summary>
internal sealed class MessagePlan
{
    public required int Message { get; init; }

    public required bool BigEndian { get; init; }

    /// <summary>Bytes behind the message's header.</summary>
    public required int PayloadSize { get; init; }

    /// <summary>Place of the timestamp, or -1.</summary>
    public required int TimestampOffset { get; init; }

    /// <summary>The fields, where the message is read by field.</summary>
    public FieldSlot[] Fields { get; init; } = [];

    /// <summary>Record messages: what feeds the channels, the wide field before the narrow one.</summary>
    public ChannelSource[] Native { get; init; } = [];

    /// <summary>Record messages: developer fields that stand for a field of the profile.</summary>
    public ChannelSource[] Developer { get; init; } = [];

    /// <summary>Record messages: place of the three bytes of packed speed and distance, or -1.</summary>
    public int PackedOffset { get; init; } = -1;

    /// <summary>The definition's bytes where the plan depends on developer field descriptions, else null.</summary>
    public byte[]? Definition { get; init; }

    /// <summary>The state of the descriptions for which the plan was made.</summary>
    public int DescriptionsVersion { get; init; }

    /// <summary>The timestamp of a message in seconds of the FIT epoch or of the device's uptime, or null.</summary>
    public uint? Timestamp(ReadOnlySpan<byte> payload) =>
        TimestampOffset >= 0 && FitNumber.UInt32(payload[TimestampOffset..], BigEndian) is var seconds and not uint.MaxValue ? seconds : null;
}
