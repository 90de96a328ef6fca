using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Makes plans from definitions. A definition, without its header byte: reserved, byte order, message number (2), number of fields, three bytes
/// per field (number, size, type); then, if announced, the number of developer fields and three bytes each (number, size, developer index).
/// </summary>
internal static class PlanCompiler
{
    public const int FixedSize = 5;
    public const int FieldSize = 3;

    public static MessagePlan Compile(ReadOnlySpan<byte> definition, DeveloperFields developer)
    {
        var bigEndian = definition[1] != 0;
        var message = FitNumber.UInt16(definition[2..], bigEndian);
        var fields = Fields(definition[FixedSize..], definition[4], out var nativeSize);
        var timestamp = Array.Find(fields, field => field.Number == FitFields.Timestamp && field.Size == 4 && field.Type.Size() == 4);
        var ends = FixedSize + (definition[4] * FieldSize);
        var tail = ends < definition.Length ? definition[(ends + 1)..] : [];
        var isRecord = message == FitMessages.Record;
        return new MessagePlan
        {
            Message = message,
            BigEndian = bigEndian,
            PayloadSize = nativeSize + SizesOf(tail),
            TimestampOffset = timestamp.Size == 4 ? timestamp.Offset : -1,
            Fields = FitMessages.IsRead(message) && !isRecord ? Array.FindAll(fields, field => field.Size > 0) : [],
            Native = isRecord ? Native(fields) : [],
            Developer = isRecord ? Developer(tail, nativeSize, developer) : [],
            PackedOffset = isRecord ? Packed(fields) : -1,
            Definition = isRecord && tail.Length > 0 ? definition.ToArray() : null,
            DescriptionsVersion = developer.Version,
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

    private static int SizesOf(ReadOnlySpan<byte> developerEntries)
    {
        var size = 0;
        for (var at = 0; at < developerEntries.Length; at += FieldSize)
            size += developerEntries[at + 1];

        return size;
    }

    private static ChannelSource[] Native(FieldSlot[] fields) =>
        [.. fields.OrderBy(field => ChannelSource.IsEnhanced(field.Number) ? 0 : 1).Select(ChannelSource.Native).OfType<ChannelSource>()];

    private static ChannelSource[] Developer(ReadOnlySpan<byte> entries, int offset, DeveloperFields developer)
    {
        var sources = new List<ChannelSource>();
        for (var at = 0; at < entries.Length; at += FieldSize)
        {
            if (developer.Source(entries[at + 2], entries[at], offset, entries[at + 1]) is { } source)
                sources.Add(source);

            offset += entries[at + 1];
        }

        return [.. sources];
    }

    private static int Packed(FieldSlot[] fields)
    {
        var packed = Array.Find(fields, field =>
            field is { Number: FitFields.Record.CompressedSpeedDistance, Size: >= PackedSpeedDistance.Size } && field.Type.Size() == 1);
        return packed.Size > 0 ? packed.Offset : -1;
    }
}
