using NodaTime;

namespace LoadWatch.Activities;

/// <summary>One activity: the recording that counts, and those of the same session that do not.</summary>
/// <param name="Superseded">Richest first.</param>
public sealed record SessionGroup(RecordingSummary Winner, IReadOnlyList<RecordingSummary> Superseded);

/// <summary>
/// The same session recorded by two devices or exported twice counts once (I-9): recordings that start within 2 s of the richest are one
/// activity.
/// Recordings of one file compete only if start and samples are equal. The order of richness is total, so the order of arrival never
/// matters (I-5).
/// </summary>
public static class SameSession
{
    /// <summary>How far apart two starts of one session may lie. A choice: two devices started by one hand.</summary>
    public static Duration StartTolerance { get; } = Duration.FromSeconds(2);

    /// <summary>Every recording is in exactly one group. Groups by start, then by key of the winner.</summary>
    public static IReadOnlyList<SessionGroup> Choose(IReadOnlyList<RecordingSummary> ofOnePerson)
    {
        List<(RecordingSummary Winner, List<RecordingSummary> Superseded)> groups = [];
        foreach (var recording in RichestFirst(ofOnePerson))
        {
            var group = groups.FindIndex(one => Competes(one.Winner, recording));
            if (group < 0)
            {
                groups.Add((recording, []));
            }
            else
            {
                groups[group].Superseded.Add(recording);
            }
        }

        return [.. groups
            .OrderBy(group => group.Winner.Start)
            .ThenBy(group => group.Winner.Sha, StringComparer.Ordinal)
            .ThenBy(group => group.Winner.Part)
            .Select(group => new SessionGroup(group.Winner, group.Superseded))];
    }

    private static IEnumerable<RecordingSummary> RichestFirst(IEnumerable<RecordingSummary> recordings) => recordings
        .OrderByDescending(recording => recording.Channels)
        .ThenByDescending(recording => (long)recording.Samples + recording.Sets)
        .ThenBy(recording => recording.Start)
        .ThenBy(recording => recording.Sha, StringComparer.Ordinal)
        .ThenBy(recording => recording.Part);

    private static bool Competes(RecordingSummary winner, RecordingSummary other)
    {
        if (winner.Sha == other.Sha)
        {
            return winner.Start == other.Start && winner.SamplesDigest == other.SamplesDigest;
        }

        var apart = winner.Start - other.Start;
        return apart <= StartTolerance && -apart <= StartTolerance;
    }
}
