using LoadWatch.Activities;
using LoadWatch.Recordings;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;

namespace LoadWatch.Service.Pipeline;

/// <summary>Applies settled arrivals within one transaction and then brings the activities of every person touched up to date (I-9).</summary>
public sealed class ArrivalEffects(StoreSession session, ArrivalDecoder decoder)
{
    private readonly Dictionary<string, ActivityValues> values = new(StringComparer.Ordinal);
    private readonly SortedSet<string> touched = new(StringComparer.Ordinal);

    public void Apply(DecodedArrival arrival)
    {
        foreach (var recording in session.Recordings.OfArrival(arrival.Sha))
        {
            MarkDirty(recording);
            touched.Add(recording.Person);
        }

        session.Recordings.RemoveArrival(arrival.Sha);
        session.Questions.Ask(arrival.Sha, arrival.Questions);

        session.Arrivals.Settle(arrival.Sha, arrival.Verdict.State, arrival.Kind, arrival.Verdict.Reason, arrival.Verdict.Person);
        if (arrival.Table is { } table)
        {
            session.TableVersions.Note(arrival.Sha, table.Layout, table.IsNamedByFolder);
        }
        else
        {
            session.TableVersions.Forget(arrival.Sha);
        }

        foreach (var recording in arrival.Recordings)
        {
            session.Recordings.Add(recording.Summary);
            values[recording.Summary.Key] = recording.Values;
            touched.Add(recording.Summary.Person);
        }
    }

    public void Finish()
    {
        foreach (var person in touched)
        {
            UpdateActivities(person);
        }
    }

    private void UpdateActivities(string person)
    {
        var sessions = SameSession.Choose(session.Recordings.OfPerson(person));
        var winners = sessions.ToDictionary(group => group.Winner.Key, StringComparer.Ordinal);
        var stored = session.Activities.OfPerson(person).ToDictionary(activity => activity.Winner.Key, StringComparer.Ordinal);
        foreach (var lost in stored.Values.Where(activity => !winners.ContainsKey(activity.Winner.Key)))
        {
            session.Activities.Remove(lost.Winner.Key);
            MarkDirty(lost.Winner);
        }

        foreach (var group in sessions)
        {
            var keys = group.Superseded.Append(group.Winner).Select(recording => recording.Key).Order(StringComparer.Ordinal).ToList();
            var isNew = values.ContainsKey(group.Winner.Key);
            if (!isNew && stored.TryGetValue(group.Winner.Key, out var same) && same.RecordingKeys.SequenceEqual(keys, StringComparer.Ordinal))
            {
                continue;
            }

            session.Activities.Put(new StoredActivity(group.Winner, ValuesOf(group.Winner), keys));
            MarkDirty(group.Winner);
        }
    }

    /// <summary>Values computed in this group, else computed again from the archive: a recording that lost before has none stored.</summary>
    private ActivityValues ValuesOf(RecordingSummary recording) =>
        values.TryGetValue(recording.Key, out var fresh) ? fresh : decoder.Recompute(session.Arrivals.Get(recording.Sha)!, recording.Part, recording.Person);

    private void MarkDirty(RecordingSummary recording) => session.People.MarkDirty(recording.Person, recording.Date);
}
