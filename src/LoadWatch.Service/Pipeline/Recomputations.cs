using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Decodes and judges contents again whose basis changed: the configuration, the formulas, or rows of tables (a planned session was moved, a reference value was
/// measured). One person after the other; a content is done in the commit of its new rows, so whoever is stopped goes on with the rest, and until then the old
/// rows stand.
/// </summary>
public sealed class Recomputations(Store store, ArchiveReader reader, Settlement settlement, SweepReport report)
{
    private const int ReadTogether = 256;

    /// <summary>Called with each original that is through.</summary>
    public Action Progressed { get; set; } = () => { };

    /// <summary>Goes on until nothing is outdated or the patience is over; then a person is finished whose contents were begun.</summary>
    public void Run(Patience patience, CancellationToken cancel)
    {
        store.Write(MarkAsked);
        try
        {
            foreach (var piece in Outdated(patience, cancel).SelectMany(Contents).InPieces().OneAhead())
            {
                settlement.Begin(piece, force: true, gone: [], session => session.Outdated.Done(piece.Select(seen => seen.Content.Sha)));
                report.Recomputed += piece.Count;
            }
        }
        finally
        {
            settlement.Finish();
        }

        cancel.ThrowIfCancellationRequested();
    }

    /// <summary>What changed rows of tables bear on.</summary>
    private static void MarkAsked(StoreSession session)
    {
        var asked = session.Recomputations.All();
        foreach (var one in asked)
        {
            session.Outdated.AddRecordings(one.Person, Near(one.From, -1), one.To == LocalDate.MaxIsoValue ? Latest : Near(one.To, 2));
        }

        if (asked.Any(one => one.To == LocalDate.MaxIsoValue))
        {
            // By another reference value they may be their owner's, or no longer be.
            session.Outdated.AddInState(ArrivalState.Held);
            session.Outdated.AddAsked();
        }

        if (asked.Count > 0)
        {
            session.Recomputations.Done(asked);
        }
    }

    private static readonly Instant Latest = Instant.FromUtc(9999, 1, 1, 0, 0);

    /// <summary>A recording or a planned session may run past midnight, and a local date is not that of the start in UTC.</summary>
    private static Instant Near(LocalDate date, int days) => date.PlusDays(days + Math.Sign(days)).AtMidnight().InUtc().ToInstant();

    private IEnumerable<OutdatedObject> Outdated(Patience patience, CancellationToken cancel)
    {
        OutdatedObject? last = null;
        while (store.Read(session => session.Outdated.Next(last, ReadTogether)) is { Count: > 0 } next)
        {
            foreach (var original in next)
            {
                var isOther = last is null || original.Person != last.Person || original.Person.Length == 0;
                if (cancel.IsCancellationRequested || (isOther && !patience.AllowsMore()))
                {
                    yield break;
                }

                yield return original;
                last = original;
                Progressed();
            }
        }
    }

    /// <summary>The outdated contents of an original; all that is in it where itself is outdated.</summary>
    private IEnumerable<SeenContent> Contents(OutdatedObject original)
    {
        var left = store.Read(session => session.Outdated.Of(original)).ToHashSet(StringComparer.Ordinal);
        if (left.Count == 0)
        {
            yield break; // Done with the archive file around them.
        }

        var all = left.Contains(original.ObjectSha);
        var contents = reader.Kept(original.ObjectSha);
        foreach (var seen in contents ?? [])
        {
            if (left.Remove(seen.Content.Sha) || all)
            {
                yield return seen;
            }
        }

        foreach (var sha in left)
        {
            Refuse(sha, contents is null ? Recovery.Damaged : "the archive file around it no longer holds it");
        }
    }

    /// <summary>The others go on; the row says what is missing, and a later rebuild finds it again once the original is back.</summary>
    private void Refuse(string sha, string reason) => settlement.Refuse(sha, reason, session => session.Outdated.Done([sha]));
}
