using LoadWatch.Decoding;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Takes changed files in, in groups that share one folder sync and two commits. The order of I-2: durable copy, rename, folder sync, commit "waiting",
/// decode, commit of all effects, and only then the inbox.
/// </summary>
public sealed class Intake(
    WorkingConfiguration configuration, Store store, Archive archive, DecoderSet decoders, Settlement settlement, Instant now, SweepReport report)
{
    private const int GroupFiles = 64;
    private const long GroupBytes = 32L * 1024 * 1024;

    public void TakeIn(IReadOnlyList<(FoundFile File, FileStamp Stamp)> files, CancellationToken cancel)
    {
        var taker = new FileTaker(configuration, archive, decoders, now, report);
        foreach (var group in Groups(files))
        {
            cancel.ThrowIfCancellationRequested();
            var taken = Stage(group, taker);
            if (taken.Count > 0)
            {
                TakeGroup(taken);
            }
        }
    }

    /// <summary>A failing disk ends the sweep; what was staged until then goes, since nobody else would remove it before the next start.</summary>
    private static List<TakenFile> Stage(List<FoundFile> group, FileTaker taker)
    {
        var taken = new List<TakenFile>();
        try
        {
            foreach (var file in group.Select(taker.Take).OfType<TakenFile>())
            {
                taken.Add(file);
                KillPoint.Pass("staged");
            }

            return taken;
        }
        catch
        {
            taken.ForEach(file => Archive.Discard(file.Copy));
            throw;
        }
    }

    private void TakeGroup(List<TakenFile> taken)
    {
        archive.Commit(taken.ConvertAll(file => file.Copy));
        KillPoint.Pass("archived");
        store.Write(session => RecordWaiting(session, taken));
        KillPoint.Pass("waiting");
        foreach (var piece in Contents(taken.Where(IsHarmless)).InPieces())
        {
            settlement.Settle(piece, force: false, gone: [], session => RecordNames(session, piece));
        }

        KillPoint.Pass("settled");
        foreach (var file in taken.Where(file => file.File.Inbox.Take == TakeMode.Move))
        {
            InboxRemoval.Remove(file);
        }
    }

    private void RecordWaiting(StoreSession session, List<TakenFile> taken)
    {
        foreach (var file in taken)
        {
            // A name stands for "taken": that of a known content comes with its effects, since nothing waits for a restart to take it up.
            if (session.Arrivals.AddWaiting(file.Copy.Sha, null, file.Copy.Sha, file.Copy.Size) || !IsHarmless(session, file))
            {
                session.Sightings.Upsert(file.File.Inbox.Name, file.File.Path, file.Copy.Sha, now, file.Stamp);
            }
        }
    }

    private static void RecordNames(StoreSession session, IReadOnlyList<SeenContent> piece)
    {
        foreach (var (content, origin) in piece.Where(seen => seen.Content.ParentSha is null))
        {
            session.Sightings.Upsert(origin!.Inbox, content.Path, content.Sha, origin.FirstSeen, origin.Stamp);
        }
    }

    private bool IsHarmless(TakenFile file) => store.Read(session => IsHarmless(session, file));

    private static bool IsHarmless(StoreSession session, TakenFile file) =>
        session.Arrivals.Get(file.Copy.Sha) is not { } known || !Recovery.IsPoisonous(known);

    private IEnumerable<SeenContent> Contents(IEnumerable<TakenFile> taken) =>
        taken.SelectMany(file => ArrivalContent.Expand(decoders, file.Copy.Sha, file.File.Path, file.Copy.Bytes)
            .Select(content => new SeenContent(content, new Origin(file.File.Inbox.Name, now, file.Stamp))));

    private static IEnumerable<List<FoundFile>> Groups(IReadOnlyList<(FoundFile File, FileStamp Stamp)> files)
    {
        var group = new List<FoundFile>();
        long bytes = 0;
        foreach (var (file, stamp) in files)
        {
            if (group.Count > 0 && (group.Count == GroupFiles || bytes + stamp.Size > GroupBytes))
            {
                yield return group;
                group = [];
                bytes = 0;
            }

            group.Add(file);
            bytes += stamp.Size;
        }

        if (group.Count > 0)
        {
            yield return group;
        }
    }
}
