using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>A field of a record message that feeds a channel: value = raw / <paramref name="Scale"/> - <paramref name="Shift"/>.</summary>
internal readonly record struct ChannelSource(Channel Channel, FieldSlot Slot, double Scale, double Shift)
{
    /// <summary>Bytes of a single whole number without a sign, the usual kind; 0 for every other.</summary>
    public int Width { get; } = (Slot.Type, Slot.Count) switch
    {
        (FitBaseType.Unsigned8, 1) => sizeof(byte),
        (FitBaseType.Unsigned16, 1) => sizeof(ushort),
        (FitBaseType.Unsigned32, 1) => sizeof(uint),
        _ => 0,
    };

    public double Read(ReadOnlySpan<byte> payload, bool bigEndian)
    {
        var bytes = payload.Slice(Slot.Offset, Slot.Size);
        return Width switch
        {
            sizeof(byte) => bytes[0] is var raw and not byte.MaxValue ? (raw / Scale) - Shift : double.NaN,
            sizeof(ushort) => FitNumber.UInt16(bytes, bigEndian) is var raw and not ushort.MaxValue ? (raw / Scale) - Shift : double.NaN,
            sizeof(uint) => FitNumber.UInt32(bytes, bigEndian) is var raw and not uint.MaxValue ? (raw / Scale) - Shift : double.NaN,
            _ => (FitNumber.FirstValid(bytes, Slot.Type, bigEndian) / Scale) - Shift,
        };
    }

    /// <summary>The source for a field of the profile, or null where the field feeds no channel.</summary>
    public static ChannelSource? Native(FieldSlot slot)
    {
        if (ChannelOf(slot.Number) is not { } channel || slot.Count == 0)
            return null;

        var (scale, shift) = slot.Type.IsFloat() ? (1, 0) : ScaleOf(channel);
        return new ChannelSource(channel, slot, scale, shift);
    }

    public static Channel? ChannelOf(byte field) => field switch
    {
        FitFields.Record.HeartRate => Channel.HeartRate,
        FitFields.Record.Power => Channel.Power,
        FitFields.Record.EnhancedSpeed or FitFields.Record.Speed => Channel.Speed,
        FitFields.Record.Cadence => Channel.Cadence,
        FitFields.Record.Distance => Channel.Distance,
        FitFields.Record.EnhancedAltitude or FitFields.Record.Altitude => Channel.Altitude,
        _ => null,
    };

    /// <summary>The wide fields are asked before the narrow ones they replace.</summary>
    public static bool IsEnhanced(byte field) => field is FitFields.Record.EnhancedSpeed or FitFields.Record.EnhancedAltitude;

    /// <summary>How the profile scales whole numbers of a channel.</summary>
    public static (double Scale, double Shift) ScaleOf(Channel channel) => channel switch
    {
        Channel.Speed => (1000, 0),
        Channel.Distance => (100, 0),
        Channel.Altitude => (5, 500),
        _ => (1, 0),
    };
}
