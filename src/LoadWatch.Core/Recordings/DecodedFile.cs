using LoadWatch.Rows;

namespace LoadWatch.Recordings;

/// <summary>What one content holds after decoding: recordings, problems, and for a FIT file what kind of file it says it is.</summary>
/// <param name="Kind"><c>fit</c>, <c>csv</c> or <c>table</c>.</param>
/// <param name="FileType">The FIT file type in the profile's words (<c>activity</c>, <c>settings</c>), or null.</param>
/// <param name="SourceName">Names what wrote it where no device is stated: the layout of a CSV; null for FIT.</param>
public sealed record DecodedFile(
    string Kind,
    string? FileType,
    string? SourceName,
    IReadOnlyList<Recording> Recordings,
    IReadOnlyList<Problem> Problems)
{
    /// <summary>Rows of a table where the content is one; only where a device wrote it are there recordings beside it. Null for everything else.</summary>
    public DecodedTable? Table { get; init; }

    /// <summary>
    /// Where a device wrote the table, one entry a date with its numbers and a moment of that date, without samples: they tell whose it was. Empty for everything else.
    /// </summary>
    public IReadOnlyList<Recording> Worn { get; init; } = [];
}
