using LoadWatch.Activities;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Applies settled arrivals within one transaction and then brings the activities around all that changed up to date (I-9).</summary>
public sealed class ArrivalEffects(StoreSession session, RecordingShelf shelf, SessionValues values)
{
    private readonly Dictionary<string, List<RecordingSummary>> touched = new(StringComparer.Ordinal);

    public void Apply(DecodedArrival arrival)
    {
        foreach (var recording in session.Recordings.OfArrival(arrival.Sha))
        {
            MarkWon(recording);
            Touch(recording);
        }

        session.Recordings.RemoveArrival(arrival.Sha);
        session.Questions.Ask(arrival.Sha, arrival.Questions);

        session.Arrivals.Settle(arrival.Sha, arrival.Verdict.State, arrival.Kind, arrival.Verdict.Reason, arrival.Verdict.Person, arrival.Problems);
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
            Touch(recording.Summary);
        }
    }

    /// <summary>A name that changed hands may make what it held before a correction's predecessor, or current again.</summary>
    public void TouchNames(string sha)
    {
        if (session.Sightings.NameSakes(sha) is { Count: > 0 } others)
        {
            others.Append(sha).SelectMany(session.Recordings.OfArrival).ToList().ForEach(Touch);
        }
    }

    public void Finish()
    {
        foreach (var (person, recordings) in touched.OrderBy(pair => pair.Key, StringComparer.Ordinal))
        {
            var planning = new SessionPlanning(session, shelf, (from, to) => session.Recordings.Starting(person, from, to));
            foreach (var group in planning.Around(recordings).Where(group => group.Count > 0))
            {
                Update(group, planning);
            }
        }
    }

    private void Touch(RecordingSummary recording)
    {
        if (!touched.TryGetValue(recording.Person, out var list))
        {
            touched[recording.Person] = list = [];
        }

        list.Add(recording);
    }

    /// <summary>The activities that a recording had won go with it.</summary>
    private void MarkWon(RecordingSummary recording)
    {
        foreach (var won in session.Activities.Merges(recording.Person, recording.Start, recording.Start).Where(won => won.Winner.Key == recording.Key))
        {
            session.People.MarkDirty(recording.Person, won.Date);
        }
    }

    private void Update(IReadOnlyList<RecordingSummary> group, SessionPlanning planning)
    {
        var stored = planning.Stored(group);
        var plans = planning.Plan(group, plan => planning.ChangeOf(plan, stored) == SessionChange.Values && !values.IsKnown(plan));
        var winners = plans.Select(plan => plan.Winner.Key).ToHashSet(StringComparer.Ordinal);
        foreach (var lost in stored.Values.Where(one => !winners.Contains(one.Winner.Key)))
        {
            session.Activities.Remove(lost.Winner.Key);
            session.People.MarkDirty(lost.Winner.Person, lost.Date);
        }

        foreach (var plan in plans)
        {
            Put(plan, planning.ChangeOf(plan, stored), stored.GetValueOrDefault(plan.Winner.Key));
        }
    }

    private void Put(SessionPlan plan, SessionChange change, StoredMerge? before)
    {
        var merge = StoredMerge.Of(plan);
        switch (change)
        {
            case SessionChange.None:
                return;
            case SessionChange.Recordings:
                session.Activities.PutRecordings(merge);
                break;
            default:
                session.Activities.Put(new StoredActivity(merge, values.Of(plan, session.Arrivals.Get)));
                break;
        }

        session.People.MarkDirty(plan.Winner.Person, before is null ? merge.Date : LocalDate.Min(before.Date, merge.Date));
    }
}
