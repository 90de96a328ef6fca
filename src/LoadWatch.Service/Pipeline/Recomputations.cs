using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Recordings;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Decodes and judges contents again whose basis changed: the configuration, the formulas, or rows of tables (a planned session was moved, a reference value was
/// measured). One person after the other; a content is done in the commit of its new rows, so whoever is stopped goes on with the rest, and until then the old
/// rows stand. Where the process ended amid them, what was under way is tried in a child process first, like what was waiting then (I-4).
/// </summary>
public sealed class Recomputations(Store store, Archive archive, ArchiveReader reader, Settlement settlement, IDecodeProbe probe, SweepReport report)
{
    /// <summary>No fewer than may be under way at once.</summary>
    private const int ReadTogether = 256;

    private readonly HashSet<OutdatedObject> suspects = [];
    private bool isProbed;

    /// <summary>How many outdated contents are left aside because they end a child: nobody waits for them (I-4).</summary>
    public int Aside => store.Read(session => suspects.Sum(original => session.Outdated.Of(original).Count));

    /// <summary>Called with each original that is through.</summary>
    public Action Progressed { get; set; } = () => { };

    /// <summary>Goes on until nothing is outdated or the patience is over; then a person is finished whose contents were begun.</summary>
    public void Run(Patience patience, CancellationToken cancel)
    {
        var wasStopped = store.Write(Begin);
        try
        {
            foreach (var piece in Outdated(wasStopped, patience, cancel).SelectMany(Contents).InPieces().OneAhead())
            {
                settlement.Begin(piece, force: true, gone: [], session => session.Outdated.Done(piece.Select(seen => seen.Content.Sha)));
                report.Recomputed += piece.Count;
            }
        }
        finally
        {
            settlement.Finish();
        }

        if (suspects.Count == 0)
        {
            store.Write(session => session.Derived.SetRecomputing(false));
        }

        cancel.ThrowIfCancellationRequested();
    }

    /// <returns>Whether the process ended the last time amid contents that are still outdated.</returns>
    private static bool Begin(StoreSession session)
    {
        MarkAsked(session);
        var wasStopped = session.Derived.IsRecomputing();
        session.Derived.SetRecomputing(session.Outdated.Next(null, 1).Count > 0);
        return wasStopped;
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

    private IEnumerable<OutdatedObject> Outdated(bool wasStopped, Patience patience, CancellationToken cancel)
    {
        OutdatedObject? last = null;
        while (store.Read(session => session.Outdated.Next(last, ReadTogether)) is { Count: > 0 } next)
        {
            if (wasStopped && !isProbed)
            {
                isProbed = true;
                Probe(next);
            }

            foreach (var original in next.Where(original => !suspects.Contains(original)))
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

            last = next[^1];
        }
    }

    /// <summary>Leaves those aside that end a child; each such end is an attempt. One that is not what it was is refused where it is read.</summary>
    private void Probe(IReadOnlyList<OutdatedObject> originals)
    {
        if (originals.Count == 1 || !Survives(originals))
        {
            var dying = originals.Where(original => !Survives([original]) && archive.Verify(original.ObjectSha)).ToList();
            suspects.UnionWith(dying);
            dying.ForEach(CountAttempt);
        }
    }

    private bool Survives(IReadOnlyList<OutdatedObject> originals) => probe.Survives(
        [.. originals.Select(original => archive.PathOf(original.ObjectSha))],
        store.Read(session => originals.Sum(original => session.Arrivals.Get(original.ObjectSha)?.Size ?? 0)));

    private void CountAttempt(OutdatedObject original)
    {
        foreach (var sha in store.Read(session => session.Outdated.Of(original)))
        {
            store.Write(session => session.Arrivals.CountAttempt(sha));
            if (store.Read(session => session.Arrivals.Get(sha)) is { } arrival && arrival.Attempts >= ArrivalTable.MostAttempts)
            {
                Refuse(sha, Recovery.Poisonous);
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
