using System.Globalization;
using System.Text;
using LoadWatch.Notices;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Explain;

/// <summary>What became of a file: its state with the reason, where it was seen, and the sessions it gave.</summary>
public static class FileExplanation
{
    /// <summary>Null where no arrival has that path or hash.</summary>
    public static string? Of(WorkingConfiguration configuration, StoreSession session, string word)
    {
        var found = MeantArrivals.Of(session, word);
        return found.Count == 0 ? null : string.Join(Environment.NewLine, found.Select(arrival => Write(configuration, session, arrival)));
    }

    private static string Write(WorkingConfiguration configuration, StoreSession session, Arrival arrival)
    {
        var text = new StringBuilder();
        text.AppendLine(CultureInfo.InvariantCulture, $"{arrival.Sha}  {arrival.Kind ?? "not decoded yet"}, {arrival.Size} bytes");
        text.AppendLine(CultureInfo.InvariantCulture, $"    {Words.Of(arrival.State)}{(arrival.Reason is { } reason ? $": {OneLine.Of(reason)}" : "")}");
        foreach (var sighting in session.Sightings.Of(arrival.Sha))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    seen as {OneLine.Of(sighting.Path)} in {OneLine.Of(sighting.Inbox)}");
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

        foreach (var activity in configuration.People.Keys.SelectMany(id => session.Activities.OfPerson(id)))
        {
            foreach (var key in activity.RecordingKeys.Where(key => key.StartsWith(arrival.Sha, StringComparison.Ordinal)))
            {
                var role = key == activity.Winner.Key ? "is" : "is superseded in";
                text.AppendLine(CultureInfo.InvariantCulture, $"    part {key[65..]} {role} the session {Words.Start(activity.Winner.Start.WithOffset(activity.Winner.LocalOffset))} of {activity.Winner.Person}");
            }
        }

        return text.ToString();
    }
}
