namespace LoadWatch.Decoding.Fit;

/// <summary>A definition made ready for its messages: lengths summed, places looked up. It may serve several parts, one after the other.</summary>
internal sealed class MessagePlan
{
    private DeveloperFields? boundTo;
    private int boundVersion;

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

    /// <summary>Record and session messages: developer fields that hold bytes.</summary>
    public DeveloperSlot[] DeveloperSlots { get; init; } = [];

    /// <summary>Record messages: developer fields that stand for a field of the profile, as described when last bound.</summary>
    public ChannelSource[] Developer { get; private set; } = [];

    /// <summary>Nothing of it is read but its length and its time.</summary>
    public required bool IsPassedOver { get; init; }

    /// <summary>Record messages with a time whose channels have one source each: they can be read field by field.</summary>
    public bool IsColumnar { get; init; }

    /// <summary>Record messages: place of the three bytes of packed speed and distance, or -1.</summary>
    public int PackedOffset { get; init; } = -1;

    /// <summary>The timestamp of a message in seconds of the FIT epoch or of the device's uptime, or null.</summary>
    public uint? Timestamp(ReadOnlySpan<byte> payload) =>
        TimestampOffset >= 0 && FitNumber.UInt32(payload[TimestampOffset..], BigEndian) is var seconds and not uint.MaxValue ? seconds : null;

    /// <summary>Binds the developer fields anew where descriptions changed since the last time.</summary>
    public void Bind(DeveloperFields developer)
    {
        if (DeveloperSlots.Length == 0 || (boundTo == developer && boundVersion == developer.Version))
            return;

        Developer = [.. DeveloperSlots.Select(developer.Source).OfType<ChannelSource>()];
        (boundTo, boundVersion) = (developer, developer.Version);
    }
}

/// <summary>A developer field of a definition; its type is in its description.</summary>
internal readonly record struct DeveloperSlot(byte DeveloperIndex, byte Number, int Offset, int Size);
