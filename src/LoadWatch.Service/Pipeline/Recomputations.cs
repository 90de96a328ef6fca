using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Computes recordings again that changed rows of tables bear on: a planned session was moved, a reference value was measured.</summary>
public sealed class Recomputations(Store store, Archive archive, ArchiveReader reader, Settlement settlement)
{
    private static readonly LocalDate FirstDate = new(1, 1, 1);

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
            .SelectMany(one => session.Recordings.OfPerson(one.Person).Where(recording => IsNear(recording.Date, one)))
            .Select(recording => recording.Sha)
            .Concat(asked.Any(IsOpen) ? LeftOut(session) : [])
            .Distinct(StringComparer.Ordinal)
            .Select(sha => session.Arrivals.Get(sha)!)
            .Where(arrival => arrival.State is ArrivalState.Stored or ArrivalState.Held),
    ];

    /// <summary>On the dates or next to them: a recording or a planned session may run past midnight.</summary>
    private static bool IsNear(LocalDate date, Recomputation asked) => date.PlusDays(1) >= asked.From && date.PlusDays(-1) <= asked.To;

    /// <summary>Of a reference value, which holds from its date on.</summary>
    private static bool IsOpen(Recomputation asked) => asked.To == LocalDate.MaxIsoValue;

    /// <summary>Held contents, and those of which a part is left out: by another reference value they may be their owner's.</summary>
    private static IEnumerable<string> LeftOut(StoreSession session) => session.Arrivals.InState(ArrivalState.Held)
        .Select(arrival => arrival.Sha)
        .Concat(session.Questions.OfContentsSince(FirstDate).Select(question => question.Sha));
}
