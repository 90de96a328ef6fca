using LoadWatch.Activities;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;

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
        var longOnes = plans.ToLookup(plan => plan.Givers.Select(key => shelf.PlaceInLong(key, ArrivalOf)).FirstOrDefault(place => place is not null));
        values.Foresee(longOnes[null].AsParallel().AsOrdered().Select(plan => (plan, values.Of(plan, ArrivalOf))).ToList());

        // In the order of the file, which is read once for all of them.
        values.Foresee(longOnes.Where(plan => plan.Key is not null).OrderBy(plan => plan.Key!.Value.Sha, StringComparer.Ordinal).ThenBy(plan => plan.Key!.Value.Part)
            .SelectMany(plan => plan).Select(plan => (plan, values.Of(plan, ArrivalOf))).ToList());
        shelf.Close();
    }

    private Arrival? ArrivalOf(string sha) => store.Read(session => session.Arrivals.Get(sha));

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
