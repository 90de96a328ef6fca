using LoadWatch.Decoding;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Takes changed files in, in groups that share one round of syncs and two commits. The order of I-2: durable copy, rename, folder sync, commit "waiting",
/// decode, commit of all effects, and only then the inbox. At most three groups are under way, each at its own step: one is copied, one is decoded, one commits.
/// </summary>
public sealed class Intake(
    WorkingConfiguration configuration, Store store, Archive archive, DecoderSet decoders, Settlement settlement, KnownFiles known, Instant now, SweepReport report)
{
    private const int GroupFiles = 64;
    private const long GroupBytes = 8L * 1024 * 1024;

    /// <summary>Files read at once: a share answers each slowly, and many together.</summary>
    private const int ReadTogether = 4;

    public void TakeIn(IReadOnlyList<(FoundFile File, FileStamp Stamp)> files, CancellationToken cancel)
    {
        try
        {
            foreach (var group in Waiting(files, cancel).OneAhead())
            {
                Settle(group);
            }
        }
        finally
        {
            settlement.Finish();
        }

        cancel.ThrowIfCancellationRequested();
    }

    /// <summary>Groups that are durable and waiting. After a cancellation no new one begins; those begun are settled, else a restart would have to try them first.</summary>
    private IEnumerable<WaitingGroup> Waiting(IReadOnlyList<(FoundFile File, FileStamp Stamp)> files, CancellationToken cancel)
    {
        var taker = new FileTaker(configuration, archive, decoders, now);
        foreach (var group in Groups(files).TakeWhile(_ => !cancel.IsCancellationRequested))
        {
            if (Stage(group, taker) is { Count: > 0 } taken)
            {
                yield return MakeDurable(taken);
            }
        }
    }

    /// <summary>A failing disk ends the sweep; what was staged until then goes, since nobody else would remove it before the next start.</summary>
    private List<TakenFile> Stage(List<FoundFile> group, FileTaker taker)
    {
        var takings = group.AsParallel().AsOrdered().WithDegreeOfParallelism(ReadTogether).Select(file => Attempt<Taking>.Of(() => taker.Take(file))).ToList();
        var taken = takings.Select(taking => taking.Outcome).OfType<Taking.Taken>().Select(one => one.File).ToList();
        if (takings.Find(taking => taking.Outcome is null) is { } failed)
        {
            taken.ForEach(file => Archive.Discard(file.Copy));
            failed.Throw();
        }

        foreach (var taking in takings)
        {
            KillPoint.Pass("staged");
            Report(taking.Outcome!);
        }

        return taken;
    }

    private void Report(Taking taking)
    {
        switch (taking)
        {
            case Taking.Settling:
                report.Settling++;
                break;
            case Taking.Unreadable unreadable:
                report.Unreadable.Add(unreadable.Line);
                break;
            default:
                break;
        }

        report.Advanced();
    }

    private WaitingGroup MakeDurable(List<TakenFile> taken)
    {
        try
        {
            archive.Commit(taken.ConvertAll(file => file.Copy));
        }
        catch
        {
            taken.ForEach(file => Archive.Discard(file.Copy));
            throw;
        }

        KillPoint.Pass("archived");
        var group = store.Write(session => RecordWaiting(session, taken));
        KillPoint.Pass("waiting");
        return group;
    }

    private WaitingGroup RecordWaiting(StoreSession session, List<TakenFile> taken)
    {
        // One that has ended a child stays where it is: no process but a child may touch it until it is judged.
        var suspects = taken.Where(file => session.Arrivals.Get(file.Copy.Sha) is { State: Recordings.ArrivalState.Waiting } arrival && Recovery.IsSuspect(arrival)).ToList();
        suspects.ForEach(file => file.Copy.Dispose());
        var group = new WaitingGroup([.. taken.Except(suspects)]);
        foreach (var file in group.Taken)
        {
            var isNew = session.Arrivals.AddWaiting(file.Copy.Sha, null, file.Copy.Sha, file.Copy.Size);
            var isHarmless = isNew || session.Arrivals.Get(file.Copy.Sha) is not { } arrival || !Recovery.IsPoisonous(arrival);
            if (isHarmless)
            {
                group.Harmless.Add(file);
            }

            // A name stands for "taken": that of a known content comes with its effects, since nothing waits for a restart to take it up.
            if (isNew || !isHarmless)
            {
                session.Sightings.Upsert(file.File.Inbox.Name, file.File.Path, file.Copy.Sha, now, file.Stamp);
                group.Named.Add((file.File.Inbox.Name, file.File.Path));
            }
        }

        return group;
    }

    private void Settle(WaitingGroup group)
    {
        foreach (var piece in Contents(group.Harmless).InPieces())
        {
            settlement.Begin(piece, force: false, gone: [], session => RecordNames(session, group, piece));
        }

        settlement.Then(() => Finish(group));
    }

    private static void RecordNames(StoreSession session, WaitingGroup group, IReadOnlyList<SeenContent> piece)
    {
        foreach (var (content, origin) in piece.Where(seen => seen.Content.ParentSha is null && !group.Named.Contains((seen.Origin!.Inbox, seen.Content.Path))))
        {
            session.Sightings.Upsert(origin!.Inbox, content.Path, content.Sha, origin.FirstSeen, origin.Stamp);
        }
    }

    private IEnumerable<SeenContent> Contents(IEnumerable<TakenFile> taken) =>
        taken.SelectMany(file => Contents(file)
            .Select(content => new SeenContent(content, new Origin(file.File.Inbox.Name, now, file.Stamp))));

    /// <summary>What was not held is read from the archive, where it is durable by now.</summary>
    private IEnumerable<ArrivalContent> Contents(TakenFile file) => file.Copy.Bytes.Length == file.Copy.Size
        ? ArrivalContent.Expand(decoders, file.Copy.Sha, file.File.Path, file.Copy.Bytes)
        : [LargeText.Of(file.Copy.Sha, file.File.Path, file.Copy.Size, () => archive.Open(file.Copy.Sha))];

    /// <summary>Every effect of the group is durable.</summary>
    private void Finish(WaitingGroup group)
    {
        KillPoint.Pass("settled");
        foreach (var file in group.Taken)
        {
            file.Copy.Dispose();
            if (file.File.Inbox.Take == TakeMode.Move)
            {
                InboxRemoval.Remove(file);
            }
            else
            {
                known.Add(file.File, file.Stamp);
            }
        }
    }

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

    /// <summary>Files whose copies are durable and whose contents wait for their effects.</summary>
    private sealed record WaitingGroup(IReadOnlyList<TakenFile> Taken)
    {
        /// <summary>Those that this process may decode.</summary>
        public List<TakenFile> Harmless { get; } = [];

        /// <summary>Names on record already, by inbox and path.</summary>
        public HashSet<(string Inbox, string Path)> Named { get; } = [];
    }
}
