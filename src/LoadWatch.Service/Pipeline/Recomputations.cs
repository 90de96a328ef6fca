using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Rows;

namespace LoadWatch.Service.Pipeline;

/// <summary>Computes recordings again that changed rows of tables bear on: a planned session was moved, a reference value was measured.</summary>
public sealed class Recomputations(Store store, Archive archive, ArchiveReader reader, Settlement settlement)
{
    public void Run(CancellationToken cancel)
    {
        var asked = store.Read(session => session.Recomputations.All());
        foreach (var kept in store.Read(session => Concerned(session, asked)).GroupBy(arrival => arrival.ObjectSha, arrival => arrival.Sha, StringComparer.Ordinal))
        {
            cancel.ThrowIfCancellationRequested();
            if (archive.Verify(kept.Key))
            {
                var shas = kept.ToHashSet(StringComparer.Ordinal);
                foreach (var piece in reader.Kept(kept.Key).Where(seen => shas.Contains(seen.Content.Sha)).InPieces())
                {
                    settlement.Settle(piece, force: true);
                }
            }
        }

        if (asked.Count > 0)
        {
            store.Write(session => session.Recomputations.Done(asked));
        }
    }

    private static List<LoadWatch.Storage.Recordings.Arrival> Concerned(StoreSession session, IReadOnlyList<Recomputation> asked) =>
    [
        .. asked
            .SelectMany(one => session.Recordings.OfPerson(one.Person).Where(recording => recording.Date >= one.From && recording.Date <= one.To))
            .Select(recording => recording.Sha)
            .Distinct(StringComparer.Ordinal)
            .Select(sha => session.Arrivals.Get(sha)!)
            .Where(arrival => arrival.State == ArrivalState.Stored),
    ];
}
