namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Makes plans from definitions. A definition, without its header byte: reserved, byte order, message number (2), number of fields, three bytes
/// per field (number, size, type); then, if announced, the number of developer fields and three bytes each (number, size, developer index).
/// </summary>
internal static class PlanCompiler
{
    public const int FixedSize = 5;
    public const int FieldSize = 3;

    public static MessagePlan Compile(ReadOnlySpan<byte> definition)
    {
        var bigEndian = definition[1] != 0;
        var message = FitNumber.UInt16(definition[2..], bigEndian);
        var fields = Fields(definition[FixedSize..], definition[4], out var nativeSize);
        var timestamp = Array.Find(fields, field => field.Number == FitFields.Timestamp && field.Size == 4 && field.Type.Size() == 4);
        var ends = FixedSize + (definition[4] * FieldSize);
        var developer = Developer(ends < definition.Length ? definition[(ends + 1)..] : [], nativeSize, out var size);
        var isRecord = message == FitMessages.Record;
        var native = isRecord ? Native(fields) : [];
        var packed = isRecord ? Packed(fields) : -1;
        return new MessagePlan
        {
            Message = message,
            BigEndian = bigEndian,
            PayloadSize = size,
            TimestampOffset = timestamp.Size == 4 ? timestamp.Offset : -1,
            IsPassedOver = !FitMessages.IsRead(message),
            Fields = FitMessages.IsRead(message) && !isRecord ? Array.FindAll(fields, field => field.Size > 0) : [],
            Native = native,
            DeveloperSlots = message is FitMessages.Record or FitMessages.Session ? developer : [],
            PackedOffset = packed,
            IsColumnar = isRecord && timestamp.Size == 4 && packed < 0 && developer.Length == 0
                && native.DistinctBy(source => source.Channel).Count() == native.Length,
        };
    }

    private static FieldSlot[] Fields(ReadOnlySpan<byte> entries, int count, out int size)
    {
        var fields = new FieldSlot[count];
        size = 0;
        for (var i = 0; i < count; i++)
        {
            var entry = entries.Slice(i * FieldSize, FieldSize);
            fields[i] = new FieldSlot(entry[0], FitBaseTypes.FromByte(entry[2]), size, entry[1]);
            size += entry[1];
        }

        return fields;
    }

    private static ChannelSource[] Native(FieldSlot[] fields) =>
        [.. fields.OrderBy(field => ChannelSource.IsEnhanced(field.Number) ? 0 : 1).Select(ChannelSource.Native).OfType<ChannelSource>()];

    /// <summary>The developer fields behind the others; those without bytes only count as absent.</summary>
    private static DeveloperSlot[] Developer(ReadOnlySpan<byte> entries, int offset, out int end)
    {
        var slots = new List<DeveloperSlot>();
        for (var at = 0; at < entries.Length; at += FieldSize)
        {
            var size = entries[at + 1];
            if (size > 0)
                slots.Add(new DeveloperSlot(entries[at + 2], entries[at], offset, size));

            offset += size;
        }

        end = offset;
        return [.. slots];
    }

    private static int Packed(FieldSlot[] fields)
    {
        var packed = Array.Find(fields, field =>
            field is { Number: FitFields.Record.CompressedSpeedDistance, Size: >= PackedSpeedDistance.Size } && field.Type.Size() == 1);
        return packed.Size > 0 ? packed.Offset : -1;
    }
}
