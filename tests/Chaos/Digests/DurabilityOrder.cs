using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Digests;

/// <summary>
/// I-2 as the kernel sees it, for a run that may have ended anywhere: a copy is durable before it is named, named and its folder durable before two commits
/// (waiting, then the effects), and only behind those does the inbox change. After a sync of the database that failed nothing more is written to it (T4).
/// </summary>
public static class DurabilityOrder
{
    private const int Commits = 2;

    /// <exception cref="ChaosFailureException">The order is broken.</exception>
    public static void MustHold(Place place, IReadOnlyList<TracedCall> calls)
    {
        ArgumentNullException.ThrowIfNull(place);
        ArgumentNullException.ThrowIfNull(calls);
        foreach (var named in calls.Where(call => call.Name == "renameat2" && call.Names("/archive/incoming/")))
        {
            var part = named.Text.Split('"')[1];
            var written = calls.LastOrDefault(call => call.Begun < named.Begun && call.Name == "pwrite64" && call.Names(part));
            Expect(Before(calls, named, call => call.Begun > (written?.Over ?? 0) && IsSync(call, part)) > 0, $"{part} is named before it is durable", named);
        }

        foreach (var taken in calls.Where(call => call.Name is "renameat2" or "unlink" or "rename" && call.Names($"\"{place.Inbox}/") && !call.Failed))
        {
            var placed = calls.Where(call => call.Over < taken.Begun && IsSync(call, place.Data + "/archive/") && !call.Names("/incoming/")).ToList();
            Expect(placed.Count > 0, "the inbox changes before the archive's folder is durable", taken);
            Expect(Before(calls, taken, call => call.Begun > placed[0].Over && IsDatabaseSync(call) && call.Succeeded) >= Commits, "the inbox changes before its effects are durable", taken);
        }

        MustStopAfterAFailedSync(calls);
    }

    private static void MustStopAfterAFailedSync(IReadOnlyList<TracedCall> calls)
    {
        if (calls.FirstOrDefault(call => IsDatabaseSync(call) && call.IsInjected && call.Failed) is { } lost)
        {
            var written = calls.FirstOrDefault(call => call.Begun > lost.Over && call.Name == "pwrite64" && call.Names("/loadwatch.db") && !call.Names("-shm"));
            Expect(written is null, $"after {lost.Text} the database is written to", written!);
        }
    }

    private static int Before(IReadOnlyList<TracedCall> calls, TracedCall than, Func<TracedCall, bool> wanted) =>
        calls.Count(call => call.Over < than.Begun && wanted(call));

    /// <summary>A sync of that file or folder, or of the whole file system.</summary>
    private static bool IsSync(TracedCall call, string path) =>
        call.Succeeded && (call.Name == "syncfs" || (call.Name is "fsync" or "fdatasync" && call.Names(path)));

    private static bool IsDatabaseSync(TracedCall call) => call.Name is "fsync" or "fdatasync" && call.Names("/loadwatch.db-wal>");

    private static void Expect(bool holds, string fault, TracedCall at)
    {
        if (!holds)
        {
            throw new ChaosFailureException($"{fault}: {at.Text}");
        }
    }
}
