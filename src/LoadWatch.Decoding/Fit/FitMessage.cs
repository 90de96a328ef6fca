using System.Text;

namespace LoadWatch.Decoding.Fit;

/// <summary>One data message, read by field number. What is absent, invalid or does not fit is null.</summary>
internal readonly ref struct FitMessage(MessagePlan plan, ReadOnlySpan<byte> payload)
{
    private readonly ReadOnlySpan<byte> payload = payload;

    public bool BigEndian => plan.BigEndian;

    public ReadOnlySpan<DeveloperSlot> DeveloperSlots => plan.DeveloperSlots;

    /// <summary>The first valid value.</summary>
    public double? Number(byte field)
    {
        var slot = Slot(field);
        if (slot.Count == 0)
            return null;

        var value = FitNumber.FirstValid(Bytes(slot), slot.Type, plan.BigEndian);
        return double.IsNaN(value) ? null : value;
    }

    /// <summary>The same with the profile's scale, which whole numbers alone have: a real number is written as it is.</summary>
    public double? Scaled(byte field, double scale) => Slot(field).Type.IsFloat() ? Number(field) : Number(field) / scale;

    /// <summary>The first valid value of a developer field, whose type is in its description.</summary>
    public double? Number(DeveloperSlot field, FitBaseType type)
    {
        var slot = new FieldSlot(field.Number, type, field.Offset, field.Size);
        return slot.Count > 0 && FitNumber.FirstValid(Bytes(slot), type, plan.BigEndian) is var value && !double.IsNaN(value) ? value : null;
    }

    public int? Int(byte field) => Number(field) is { } value && value >= int.MinValue && value <= int.MaxValue ? (int)value : null;

    /// <summary>A count of up to 32 bits: serial numbers, seconds of a date.</summary>
    public uint? UInt(byte field) => Number(field) is { } value && value >= 0 && value <= uint.MaxValue ? (uint)value : null;

    /// <summary>A date in milliseconds of the FIT epoch or of the device's uptime.</summary>
    public long? Time(byte field) => UInt(field) is { } seconds ? seconds * 1000L : null;

    /// <summary>The text up to its first zero byte; empty where there is none.</summary>
    public string Text(byte field)
    {
        var slot = Slot(field);
        var bytes = slot.Type == FitBaseType.Text ? Bytes(slot) : [];
        var end = bytes.IndexOf((byte)0);
        return Encoding.UTF8.GetString(end < 0 ? bytes : bytes[..end]);
    }

    /// <summary>The bytes of a field whose values are of this many bytes; empty where it is absent or of another width.</summary>
    public ReadOnlySpan<byte> Values(byte field, int width)
    {
        var slot = Slot(field);
        return slot.Count > 0 && slot.Type.Size() == width ? Bytes(slot) : [];
    }

    private ReadOnlySpan<byte> Bytes(FieldSlot slot) => payload.Slice(slot.Offset, slot.Size);

    private FieldSlot Slot(byte field)
    {
        foreach (var slot in plan.Fields)
        {
            if (slot.Number == field)
                return slot;
        }

        return default;
    }
}
