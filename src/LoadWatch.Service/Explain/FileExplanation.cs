using System.Globalization;
using System.Text;
using LoadWatch.Activities;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Export;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Explain;

/// <summary>What became of a file: its state with the reason, where it was seen, and the sessions it gave.</summary>
public static class FileExplanation
{
    /// <summary>Null where no arrival has that path or hash.</summary>
    public static string? Of(StoreSession session, string word)
    {
        var found = MeantArrivals.Of(session, word);
        return found.Count == 0 ? null : string.Join(Environment.NewLine, found.Select(arrival => Write(session, arrival)));
    }

    private static string Write(StoreSession session, Arrival arrival)
    {
        var text = new StringBuilder();
        text.AppendLine(CultureInfo.InvariantCulture, $"{arrival.Sha}  {arrival.Kind ?? "not decoded yet"}, {arrival.Size} bytes");
        text.AppendLine(CultureInfo.InvariantCulture, $"    {Words.Of(arrival.State)}{(arrival.Reason is { } reason ? $": {OneLine.Of(reason)}" : "")}");
        foreach (var problem in session.Arrivals.Problems(arrival.Sha).Where(problem => problem != arrival.Reason))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {OneLine.Of(problem)}");
        }

        foreach (var sighting in session.Sightings.Of(arrival.Sha))
        {
            var mismatch = NameAndContent.Mismatch(sighting.Path, arrival.Kind) is { } words ? $", {words}" : "";
            text.AppendLine(CultureInfo.InvariantCulture, $"    seen as {OneLine.Of(sighting.Path)} in {OneLine.Of(sighting.Inbox)}{(sighting.Latest ? "" : ", where other bytes are by now")}{mismatch}");
        }

        if (arrival.ParentSha is { } parent)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    came inside {parent[..12]}");
        }

        var decisions = session.Decisions.OfArrival(arrival.Sha);
        foreach (var decision in decisions)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {DecisionText.Sentence(decision, decisions)}");
        }

        foreach (var recording in session.Recordings.OfArrival(arrival.Sha))
        {
            AppendRecording(text, session, recording);
        }

        return text.ToString();
    }

    /// <summary>Every recording is in one activity; its winner starts while the recording ran, or up to the longest recording before.</summary>
    private static void AppendRecording(StringBuilder text, StoreSession session, RecordingSummary recording)
    {
        var from = recording.Start - RecordingSummary.Longest - SessionOverlap.StartTolerance;
        foreach (var merge in session.Activities.Merges(recording.Person, from, recording.End + SessionOverlap.StartTolerance))
        {
            foreach (var contribution in merge.Contributions.Where(one => one.Key == recording.Key))
            {
                text.AppendLine(CultureInfo.InvariantCulture, $"    part {recording.Part} in the session {Words.Start(merge.Session.Start.WithOffset(merge.Session.LocalOffset))} of {recording.Person}: {ContributionText.Of(session, merge, contribution)}");
                if (contribution.Role is ContributionRole.Wins or ContributionRole.Gives && session.Activities.Get(merge.Winner.Key) is { } activity)
                {
                    CutText.Append(text, activity.Values, merge.Session.LocalOffset, "        ");
                }
            }
        }
    }
}
