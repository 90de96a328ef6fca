using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// The developer fields that a part describes. One that names a record field of the profile stands in for it where that is absent, in the units of
/// its description; whether a description comes before or after the definition that uses it does not matter.
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

    private static int Key(int developer, int number) => ((developer & 0xFF) << 8) | (number & 0xFF);

    private static Description? Read(in FitMessage message)
    {
        if (message.Int(FitFields.FieldDescription.BaseType) is not { } type)
            return null;

        var scale = message.Int(FitFields.FieldDescription.Scale) is { } stated and > 1 ? stated : 1;
        var shift = message.Int(FitFields.FieldDescription.Offset) ?? 0;
        var unit = MetricUnit(message.Text(FitFields.FieldDescription.Units));
        return new Description(FitBaseTypes.FromByte(type), scale / unit, shift * unit, ChannelOf(message));
    }

    private static Channel? ChannelOf(in FitMessage message) =>
        message.Int(FitFields.FieldDescription.NativeMessage) == FitMessages.Record
        && message.Int(FitFields.FieldDescription.NativeField) is { } field and < byte.MaxValue
            ? ChannelSource.ChannelOf((byte)field)
            : null;

    /// <summary>Metres or metres per second in one of the stated unit; 1 for every other unit.</summary>
    private static double MetricUnit(string unit) => unit.Trim().ToUpperInvariant() switch
    {
        "KM/H" or "KPH" or "KMH" => 1 / 3.6,
        "MPH" => 0.44704,
        "KM" => 1000,
        "MI" => 1609.344,
        "FT" => 0.3048,
        _ => 1,
    };

    private readonly record struct Description(FitBaseType Type, double Scale, double Shift, Channel? Channel);
}
