namespace LoadWatch.Activities;

/// <summary>The recordings of one activity: the one that it is named by, and the others of the same session.</summary>
/// <param name="Others">Richest first.</param>
public sealed record SessionGroup(RecordingSummary Winner, IReadOnlyList<RecordingSummary> Others)
{
    /// <summary>The winner first, then the others.</summary>
    public IEnumerable<RecordingSummary> Recordings => [Winner, .. Others];
}

/// <summary>
/// The same session recorded by two devices or exported twice counts once (I-9). The richest recording wins and takes all that are of its session
/// (<see cref="SessionOverlap.IsOneSession"/>); of what is left the richest wins likewise, and so on. The order of richness is total, so the order of
/// arrival never matters (I-5).
/// </summary>
public static class SameSession
{
    /// <summary>Every recording is in exactly one group; groups richest winner first.</summary>
    /// <param name="replaced">Arrivals whose every name holds other contents now, with those: a correction counts before what it corrects, however
    /// rich that is; what nothing else overlaps stays, since an exporter may write all of its files under one name.</param>
    public static IReadOnlyList<SessionGroup> Choose(
        IReadOnlyCollection<RecordingSummary> ofOnePerson, IReadOnlyDictionary<string, IReadOnlyList<string>> replaced)
    {
        var left = RichestFirst(ofOnePerson, replaced).ToList();
        var groups = new List<SessionGroup>();
        while (left.Count > 0)
        {
            var winner = left[0];
            var others = left.FindAll(other => other != winner && SessionOverlap.IsOneSession(winner, other));
            groups.Add(new SessionGroup(winner, others));
            left = left.FindAll(other => other != winner && !others.Contains(other));
        }

        return groups;
    }

    /// <summary>Current before replaced; then channels, usable channels, samples and sets; then the earlier start; then content and part.</summary>
    public static IEnumerable<RecordingSummary> RichestFirst(
        IEnumerable<RecordingSummary> recordings, IReadOnlyDictionary<string, IReadOnlyList<string>> replaced) => recordings
        .OrderBy(recording => replaced.ContainsKey(recording.Sha))
        .ThenByDescending(recording => recording.Channels.Count)
        .ThenByDescending(recording => recording.Channels.UsableCount)
        .ThenByDescending(recording => (long)recording.Samples + recording.Sets)
        .ThenBy(recording => recording.Start)
        .ThenBy(recording => recording.Sha, StringComparer.Ordinal)
        .ThenBy(recording => recording.Part);
}
