using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Decodes CSV files of the kind <c>samples</c>: one file is one recording, or holds those of several people.</summary>
public static class CsvSamplesDecoder
{
    /// <summary>
    /// Picks the layout by the file's column names and reads every row by it. A row with a bad cell is a problem with its line, column and
    /// field, and
    /// the others count; with more than 1 % bad rows, or no good one, the file gives no recording. Speeds of one person that seem to be in
    /// another unit than those of the others are left out.
    /// </summary>
    /// <param name="bytes">The whole file.</param>
    /// <param name="layouts">The layouts known.</param>
    public static DecodedFile Decode(ReadOnlyMemory<byte> bytes, IReadOnlyList<CsvLayout> layouts)
    {
        ArgumentNullException.ThrowIfNull(layouts);
        var choice = LayoutChoice.Make(bytes, layouts);
        return choice.Problem is { } problem
            ? new DecodedFile("csv", FileType: null, SourceName: null, [], [problem])
            : UnitOutliers.LeaveOut(new SampleReading(choice.Table!, choice.Layout!).Read());
    }
}
