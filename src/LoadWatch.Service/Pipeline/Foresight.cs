using LoadWatch.Activities;
using LoadWatch.Storage;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Computes merged activities before the transaction that stores them, so that nothing is decoded while the database is held. It plans from the store as it
/// is now and the recordings just decoded; the transaction plans again, and computes itself what turns out otherwise.
/// </summary>
public sealed class Foresight(Store store, RecordingShelf shelf, SessionValues values)
{
    public void LookAhead(IReadOnlyList<DecodedArrival> decoded)
    {
        var plans = store.Read(session => Merged(session, decoded));
        values.Foresee(plans.AsParallel().AsOrdered().Select(plan => (plan, values.Of(plan, sha => store.Read(session => session.Arrivals.Get(sha))))).ToList());
    }

    private List<SessionPlan> Merged(StoreSession session, IReadOnlyList<DecodedArrival> decoded)
    {
        var judged = decoded.Select(arrival => arrival.Sha).ToHashSet(StringComparer.Ordinal);
        return
        [
            .. decoded
                .SelectMany(arrival => arrival.Recordings.Select(recording => recording.Summary))
                .GroupBy(recording => recording.Person, StringComparer.Ordinal)
                .SelectMany(own => Merged(session, judged, own.Key, [.. own])),
        ];
    }

    private IEnumerable<SessionPlan> Merged(StoreSession session, HashSet<string> judged, string person, List<RecordingSummary> fresh)
    {
        var planning = new SessionPlanning(session, shelf, (from, to) => session.Recordings.Starting(person, from, to)
            .Where(recording => !judged.Contains(recording.Sha))
            .Concat(fresh.Where(recording => recording.Start >= from && recording.Start <= to)));
        return planning.Around(fresh).Where(group => group.Count > 1).SelectMany(group => Wanted(planning, group));
    }

    private IEnumerable<SessionPlan> Wanted(SessionPlanning planning, IReadOnlyList<RecordingSummary> group)
    {
        var stored = planning.Stored(group);
        return planning.Plan(group, IsWanted).Where(IsWanted);

        bool IsWanted(SessionPlan plan) => planning.ChangeOf(plan, stored) == SessionChange.Values && !values.IsKnown(plan);
    }
}
