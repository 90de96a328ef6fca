using LoadWatch.Decoding.Csv.Tables;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Decodes CSV files: one of the kind <c>samples</c> is a recording or holds those of several people, one of any other kind is a table.</summary>
public static class CsvDecoder
{
    /// <summary>
    /// Picks the layout by the file's column names and reads every row by it. A row with a bad cell is a problem with its line, column and
    /// field, and the others count; with too many bad rows (more than 1 % of samples, more than 10 % of a table and more than 3) or no good one
    /// the file gives nothing. Speeds of one person that seem to be in another unit than those of the others are left out. A file of more than
    /// 2,000,000 rows is refused: <see cref="Open(Func{Stream}, IReadOnlyList{CsvLayout})"/> reads it.
    /// </summary>
    /// <param name="bytes">The whole file.</param>
    /// <param name="layouts">The layouts known.</param>
    public static DecodedFile Decode(ReadOnlyMemory<byte> bytes, IReadOnlyList<CsvLayout> layouts) => Open(CsvSource.Of(bytes), layouts, HandingOn.AtTheEnd).File;

    /// <summary>
    /// Reads a CSV of any size without holding it. Up to 2,000,000 rows it gives what <see cref="Decode"/> gives. A longer one is cut at pauses of more than
    /// 60 min, and its recordings are read through as often as they are wanted, one at hand at a time; the rows of each must stand near each other. A
    /// recording that is too long to be held is left out with a problem, and the others count.
    /// </summary>
    /// <param name="open">Opens the file at its start; the stream can seek. It is opened several times.</param>
    /// <param name="layouts">The layouts known.</param>
    /// <exception cref="IOException">The file could not be read.</exception>
    public static TextContent Open(Func<Stream> open, IReadOnlyList<CsvLayout> layouts)
    {
        ArgumentNullException.ThrowIfNull(open);
        return Open(new CsvSource(open), layouts, HandingOn.WhenFull);
    }

    /// <inheritdoc cref="Open(Func{Stream}, IReadOnlyList{CsvLayout})"/>
    /// <param name="bytes">The whole file.</param>
    /// <param name="layouts">The layouts known.</param>
    public static TextContent Open(ReadOnlyMemory<byte> bytes, IReadOnlyList<CsvLayout> layouts) => Open(CsvSource.Of(bytes), layouts, HandingOn.WhenFull);

    /// <summary>
    /// Reads a CSV of any size in flat memory: each recording of a person is handed on as it ends, numbered in that order. The rows of a person must
    /// stand in the order of sessions, and speeds in another unit are not told. A table is read whole.
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
        var choice = LayoutChoice.Make(source, layouts);
        if (choice.Layout is not { Kind: CsvKind.Samples } layout)
        {
            var file = WithoutSamples(choice);
            return new CsvReadThrough(file, file.Table is null);
        }

        var reading = new SampleReading(choice.Table!, layout, HandingOn.AsTheyEnd);
        foreach (var recording in reading.Read())
        {
            take(recording);
        }

        return new CsvReadThrough(reading.File!, reading.IsRefused);
    }

    private static TextContent Open(CsvSource source, IReadOnlyList<CsvLayout> layouts, HandingOn handingOn)
    {
        ArgumentNullException.ThrowIfNull(layouts);
        var choice = LayoutChoice.Make(source, layouts);
        return choice.Layout is { Kind: CsvKind.Samples } layout && choice.Problem is null
            ? TextContent.Of(() => new SampleReading(choice.Table!, layout, handingOn))
            : new TextContent(WithoutSamples(choice));
    }

    private static DecodedFile WithoutSamples(LayoutChoice choice) => choice.Problem is { } problem
        ? new DecodedFile("csv", FileType: null, SourceName: null, [], [problem])
        : new TableReading(choice.Table!, choice.Layout!).Read();
}

/// <summary>What came of reading a CSV through.</summary>
/// <param name="File">Without the recordings, which were handed on.</param>
/// <param name="IsRefused">The file cannot be used, and what was handed on does not count.</param>
public sealed record CsvReadThrough(DecodedFile File, bool IsRefused);
