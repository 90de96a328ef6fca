using LoadWatch.Decoding.Csv.Tables;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Decodes CSV files: one of the kind <c>samples</c> is a recording or holds those of several people, one of any other kind is a table.</summary>
public static class CsvDecoder
{
    /// <summary>
    /// Picks the layout by the file's column names and reads every row by it. A row with a bad cell is a problem with its line, column and
    /// field, and the others count; with too many bad rows (more than 1 % of samples, more than 10 % of a table and more than 3) or no good one
    /// the file gives nothing. Speeds of one person that seem to be in another unit than those of the others are left out.
    /// </summary>
    /// <param name="bytes">The whole file.</param>
    /// <param name="layouts">The layouts known.</param>
    public static DecodedFile Decode(ReadOnlyMemory<byte> bytes, IReadOnlyList<CsvLayout> layouts) => Decode(CsvSource.Of(bytes), layouts);

    /// <summary>The same of a file that is never held whole: memory holds no more than the channels and rows that it gives.</summary>
    /// <param name="open">Opens the file at its start; the stream can seek. It is opened several times.</param>
    /// <param name="layouts">The layouts known.</param>
    /// <exception cref="IOException">The file could not be read.</exception>
    public static DecodedFile Decode(Func<Stream> open, IReadOnlyList<CsvLayout> layouts)
    {
        ArgumentNullException.ThrowIfNull(open);
        return Decode(new CsvSource(open), layouts);
    }

    /// <summary>
    /// Reads a CSV of any size in flat memory: each recording of a person is handed on as it ends, numbered in that order. The rows of a person must
    /// stand in the order of time as far as sessions go, and speeds in another unit are not told. A table is read whole.
    /// </summary>
    /// <param name="open">Opens the file at its start; the stream can seek. It is opened several times and never held whole.</param>
    /// <param name="layouts">The layouts known.</param>
    /// <param name="take">Gets the recordings. They count only if the answer is not refused, which is known at the end.</param>
    /// <exception cref="IOException">The file could not be read.</exception>
    public static CsvReadThrough Read(Func<Stream> open, IReadOnlyList<CsvLayout> layouts, Action<Recording> take)
    {
        ArgumentNullException.ThrowIfNull(open);
        ArgumentNullException.ThrowIfNull(take);
        var source = new CsvSource(open);
        if (LayoutChoice.Make(source, layouts) is not { Layout: { Kind: CsvKind.Samples } layout, Table: { } table })
        {
            var file = Decode(source, layouts);
            return new CsvReadThrough(file, file.Table is null);
        }

        var reading = new SampleReading(table, layout, take);
        return new CsvReadThrough(reading.Read(), reading.IsRefused);
    }

    private static DecodedFile Decode(CsvSource source, IReadOnlyList<CsvLayout> layouts)
    {
        ArgumentNullException.ThrowIfNull(layouts);
        return LayoutChoice.Make(source, layouts) switch
        {
            { Problem: { } problem } => new DecodedFile("csv", FileType: null, SourceName: null, [], [problem]),
            { Layout.Kind: CsvKind.Samples } samples => UnitOutliers.LeaveOut(new SampleReading(samples.Table!, samples.Layout!).Read()),
            var table => new TableReading(table.Table!, table.Layout!).Read(),
        };
    }
}

/// <summary>What came of reading a CSV through.</summary>
/// <param name="File">Without the recordings, which were handed on.</param>
/// <param name="IsRefused">The file cannot be used, and what was handed on does not count.</param>
public sealed record CsvReadThrough(DecodedFile File, bool IsRefused);
