using System.Buffers.Binary;
using LoadWatch.Decoding.Fit;

namespace LoadWatch.Benchmarks;

/// <summary>
/// The least that reading a FIT file of one part takes: its checksum, and a walk that copies up to twelve columns of its records as they stand there,
/// little-endian and of 1, 2 or 4 bytes; developer fields are stepped over. What a decoder does beyond it (scale, missing values, other messages, damage) is measured against this.
/// </summary>
internal sealed class RecordFloor
{
    private const int Columns = 12;
    private const int Record = 20;
    private const int HasDeveloperFields = 0x20;
    private readonly Layout[] layouts = new Layout[16];
    private readonly uint[][] columns;
    private int rows;

    public RecordFloor(int mostRows) => columns = [.. Enumerable.Range(0, Columns).Select(_ => new uint[mostRows])];

    /// <summary>The number of records copied.</summary>
    public int Run(ReadOnlySpan<byte> file)
    {
        if (FitCrc.Of(file) != 0)
            throw new InvalidDataException("wrong checksum");

        rows = 0;
        for (var data = file[file[0]..^2]; !data.IsEmpty;)
            data = data[((data[0] & 0x40) != 0 ? Define(data) : Copy(data))..];

        return rows;
    }

    private int Define(ReadOnlySpan<byte> data)
    {
        var sizes = new int[data[5]];
        for (var field = 0; field < sizes.Length; field++)
            sizes[field] = data[6 + (field * 3) + 1];

        var end = 6 + (sizes.Length * 3);
        var behind = 0;
        if ((data[0] & HasDeveloperFields) != 0)
        {
            for (var (field, count) = (0, data[end++]); field < count; field++, end += 3)
                behind += data[end + 1];
        }

        layouts[data[0] & 0xF] = new Layout(BinaryPrimitives.ReadUInt16LittleEndian(data[3..]), sizes, sizes.Sum() + behind);
        return end;
    }

    private int Copy(ReadOnlySpan<byte> data)
    {
        var (message, sizes, size) = layouts[data[0] & 0xF];
        if (message == Record)
        {
            var at = 1;
            for (var field = 0; field < sizes.Length && field < Columns; field++)
            {
                columns[field][rows] = sizes[field] switch
                {
                    1 => data[at],
                    2 => BinaryPrimitives.ReadUInt16LittleEndian(data[at..]),
                    _ => BinaryPrimitives.ReadUInt32LittleEndian(data[at..]),
                };
                at += sizes[field];
            }

            rows++;
        }

        return 1 + size;
    }

    private readonly record struct Layout(int Message, int[] Sizes, int Size);
}
