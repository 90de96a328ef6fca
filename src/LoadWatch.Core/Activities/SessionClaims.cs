using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// To which of several activities a moment belongs, so that no moment of a channel counts twice (I-9): to the richest whose winner ran then; outside of
/// every winner to the richest of which any recording did.
/// </summary>
/// <param name="groups">Richest winner first.</param>
/// <param name="mayGive">False for recordings that give nothing to anybody.</param>
internal sealed class SessionClaims(IReadOnlyList<SessionGroup> groups, Func<SessionGroup, RecordingSummary, bool> mayGive)
{
    /// <summary>The stretches of which a recording gives nothing, as they belong to other activities.</summary>
    /// <param name="at">Number of the recording's activity among the groups.</param>
    /// <param name="channel">Null for the time itself. A winner keeps the readings of a channel that the richer one has not.</param>
    public IReadOnlyList<Stretch> Of(int at, RecordingSummary recording, Channel? channel)
    {
        var winner = groups[at].Winner;
        var richer = groups.Take(at).ToList();
        if (recording == winner)
        {
            // Sessions of one file follow one another by the word of their device; where they overlap neither loses anything.
            return Taken(richer.Where(group => group.Winner.Sha != winner.Sha && Has(group, channel)).Select(group => group.Winner), recording);
        }

        var poorer = groups.Skip(at + 1).Select(group => group.Winner)
            .Concat(richer.SelectMany(group => group.Others.Where(other => mayGive(group, other))));
        return [.. Taken(richer.Select(group => group.Winner), recording), .. Taken(poorer, recording).SelectMany(stretch => stretch.Without([Ran(winner)]))];
    }

    public static Stretch Ran(RecordingSummary recording) => new(recording.Start.ToUnixTimeMilliseconds(), recording.End.ToUnixTimeMilliseconds());

    private static IReadOnlyList<Stretch> Taken(IEnumerable<RecordingSummary> recordings, RecordingSummary of) =>
        [.. recordings.Select(Ran).Where(stretch => stretch.From < stretch.To && stretch.Within(Ran(of)) is not null)];

    private bool Has(SessionGroup group, Channel? channel) =>
        channel is null || group.Recordings.Any(recording => mayGive(group, recording) && recording.Extent(channel.Value) is { IsUsable: true });
}
