using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Takes up decisions on owners that are not in effect yet: the content is judged again, and the days of whoever had it and of whoever gets it are computed
/// anew. One that is held for another reason, its date, is looked at again by every sweep.
/// </summary>
public sealed class AssignedFiles(
    WorkingConfiguration configuration, Store store, Archive archive, ArchiveReader reader, Settlement settlement, SweepReport report)
{
    public void TakeUp(CancellationToken cancel)
    {
        foreach (var kept in store.Read(Waiting).GroupBy(arrival => arrival.ObjectSha, StringComparer.Ordinal))
        {
            cancel.ThrowIfCancellationRequested();
            if (archive.Verify(kept.Key))
            {
                Settle(kept.Key, kept.Select(arrival => arrival.Sha).ToHashSet(StringComparer.Ordinal));
            }
            else
            {
                report.Unreadable.AddRange(kept.Select(Missing));
            }
        }
    }

    private List<Arrival> Waiting(StoreSession session) => session.Decisions.Assigned().Values
        .OrderBy(decision => decision.Subject, StringComparer.Ordinal)
        .Select(decision => (Arrival: session.Arrivals.Get(decision.Subject), Owner: configuration.People.GetValueOrDefault(decision.Person)))
        .Where(item => item is { Owner: { } owner, Arrival: { State: ArrivalState.Stored or ArrivalState.Held } arrival } && arrival.Person != owner.Id)
        .Select(item => item.Arrival!)
        .ToList();

    private void Settle(string objectSha, HashSet<string> shas)
    {
        foreach (var piece in reader.Kept(objectSha).Where(seen => shas.Contains(seen.Content.Sha)).InPieces())
        {
            settlement.Settle(piece, force: true);
        }
    }

    private BriefLine Missing(Arrival arrival) => new(
        store.Read(session => session.Sightings.Of(arrival.Sha))[0].Path, "its original in the archive is missing or damaged; its owner was not changed");
}
