using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>A layout drafted from one file, for a person to finish.</summary>
/// <param name="Layout">What the file shows; <see cref="Open"/> stands where only a person can tell. Null where the file gives no draft.</param>
/// <param name="Found">What was seen, one sentence each.</param>
/// <param name="Doubts">What to settle, one sentence each with its key: what stands there was taken, or is <see cref="Open"/>.</param>
/// <param name="Problem">Why there is no draft, or null.</param>
public sealed record LayoutDraft(CsvLayout? Layout, IReadOnlyList<string> Found, IReadOnlyList<string> Doubts, Problem? Problem)
{
    /// <summary>Stands in a draft for what is to be filled in; no layout is accepted with it.</summary>
    public const string Open = "?";

    internal static LayoutDraft Refused(Problem problem) => new(Layout: null, [], [], problem);
}
