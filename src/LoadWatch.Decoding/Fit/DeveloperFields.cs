using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// The developer fields that a part describes. One that names a field of the profile stands in for it where that is absent, in the units of
/// its description; a unit that the value is not known in feeds nothing. Whether a description comes before or after the definition that uses it does not matter.
/// </summary>
internal sealed class DeveloperFields
{
    private readonly Dictionary<int, Description> descriptions = [];

    /// <summary>Changes with the descriptions.</summary>
    public int Version { get; private set; }

    public void Describe(in FitMessage message)
    {
        if (message.Int(FitFields.FieldDescription.DeveloperIndex) is not { } developer
            || message.Int(FitFields.FieldDescription.Number) is not { } number
            || Read(message) is not { } description)
            return;

        var key = Key(developer, number);
        if (descriptions.TryGetValue(key, out var known) && known == description)
            return;

        descriptions[key] = description;
        Version++;
    }

    /// <summary>What feeds a channel from a developer field, or null.</summary>
    public ChannelSource? Source(DeveloperSlot field)
    {
        if (!descriptions.TryGetValue(Key(field.DeveloperIndex, field.Number), out var described) || described.Channel is not { } channel)
            return null;

        var slot = new FieldSlot(field.Number, described.Type, field.Offset, field.Size);
        return slot.Count > 0 ? new ChannelSource(channel, slot, described.Scale, described.Shift) : null;
    }

    /// <summary>What a developer field of a session states for one of its totals, in seconds or metres; null where none does.</summary>
    /// <param name="field">The field of the profile that it stands for.</param>
    public double? Total(in FitMessage message, byte field)
    {
        foreach (var slot in message.DeveloperSlots)
        {
            if (descriptions.TryGetValue(Key(slot.DeveloperIndex, slot.Number), out var described) && described.Total == field
                && message.Number(slot, described.Type) is { } raw
                && (raw / described.Scale) - described.Shift is var value and >= 0)
                return value;
        }

        return null;
    }

    private static int Key(int developer, int number) => ((developer & 0xFF) << 8) | (number & 0xFF);

    private static Description? Read(in FitMessage message)
    {
        if (message.Int(FitFields.FieldDescription.BaseType) is not { } type)
            return null;

        var scale = message.Int(FitFields.FieldDescription.Scale) is { } stated and > 1 ? stated : 1;
        var shift = message.Int(FitFields.FieldDescription.Offset) ?? 0;
        var (channel, total, written) = (ChannelOf(message), TotalOf(message), message.Text(FitFields.FieldDescription.Units));
        var unit = channel is { } known ? Unit(known, written)
            : total is FitFields.Session.DistanceCentimetres ? Unit(Channel.Distance, written)
            : total is not null ? Seconds(written)
            : null;
        return new Description(FitBaseTypes.FromByte(type), scale / (unit ?? 1), shift * (unit ?? 1), unit is null ? null : channel, unit is null ? null : total);
    }

    private static Channel? ChannelOf(in FitMessage message) =>
        NativeField(message, FitMessages.Record) is { } field ? ChannelSource.ChannelOf(field) : null;

    private static byte? TotalOf(in FitMessage message) => NativeField(message, FitMessages.Session) switch
    {
        { } field when field is FitFields.Session.ElapsedMilliseconds or FitFields.Session.TimerMilliseconds or FitFields.Session.DistanceCentimetres => field,
        _ => null,
    };

    private static byte? NativeField(in FitMessage message, int ofMessage) =>
        message.Int(FitFields.FieldDescription.NativeMessage) == ofMessage && message.Int(FitFields.FieldDescription.NativeField) is { } field and < byte.MaxValue
            ? (byte)field
            : null;

    /// <summary>The unit of the channel in one of the stated unit; null for one that the channel is not known in. Without a word it is the channel's own.</summary>
    private static double? Unit(Channel channel, string written) => (channel, written.Trim().ToUpperInvariant()) switch
    {
        (_, "") => 1,
        (Channel.HeartRate, "BPM" or "1/MIN" or "BEATS/MIN") => 1,
        (Channel.Power, "W" or "WATT" or "WATTS") => 1,
        (Channel.Power, "KW") => 1000,
        (Channel.Cadence, "RPM" or "1/MIN") => 1,
        (Channel.Cadence, "SPM" or "STEPS/MIN") => 0.5,
        (Channel.Speed, "M/S" or "MPS" or "M/SEC") => 1,
        (Channel.Speed, "CM/S") => 0.01,
        (Channel.Speed, "MM/S") => 0.001,
        (Channel.Speed, "KM/H" or "KPH" or "KMH") => 1 / 3.6,
        (Channel.Speed, "MPH" or "MI/H") => 0.44704,
        (Channel.Distance or Channel.Altitude, "M" or "METER" or "METERS" or "METRE" or "METRES") => 1,
        (Channel.Distance or Channel.Altitude, "MM") => 0.001,
        (Channel.Distance or Channel.Altitude, "CM") => 0.01,
        (Channel.Distance or Channel.Altitude, "KM") => 1000,
        (Channel.Distance or Channel.Altitude, "MI") => 1609.344,
        (Channel.Distance or Channel.Altitude, "YD") => 0.9144,
        (Channel.Distance or Channel.Altitude, "FT") => 0.3048,
        _ => null,
    };

    /// <summary>Seconds of one in the stated unit; null for a unit that is not known. Without a word it is seconds.</summary>
    private static double? Seconds(string written) => written.Trim().ToUpperInvariant() switch
    {
        "" or "S" or "SEC" or "SECS" or "SECOND" or "SECONDS" => 1,
        "MS" or "MSEC" => 0.001,
        "MIN" or "MINUTE" or "MINUTES" => 60,
        "H" or "HOUR" or "HOURS" => 3600,
        _ => null,
    };

    /// <param name="Channel">What it feeds in a record.</param>
    /// <param name="Total">The field of a session that it stands for.</param>
    private readonly record struct Description(FitBaseType Type, double Scale, double Shift, Channel? Channel, byte? Total);
}
