using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>
/// While one FIT file is taken in and one mail leaves, the n-th call that changes files fails, or the process is killed at it, for every n there is. The next
/// sweep must end where an undisturbed one does, and the order of I-2 must show in every trace.
/// </summary>
public static class FailingCalls
{
    private const string Kill = "KILL";
    private const int InputOutput = 74;
    private const int CannotCreate = 73;
    private const int Workers = 2;
    private const int WritesTried = 3;

    /// <summary>Writes; an open is one where it may write or make the file.</summary>
    private static readonly string[] Writes = ["pwrite64", "openat"];

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("failing-writes", "D57 D59 D61", "A full disk, a failing disk or a kill at every single write, and open for writing, while one file comes in and one mail leaves.", trial => Run(trial, Writes), Needs.Tracing),
        new(
            "failing-steps",
            "D57 D59 D61",
            "The same at every sync, rename, removal, new length and new folder; a failed sync of the database ends the process with 74 and nothing more is written.",
            trial => Run(trial, ["fsync", "fdatasync", "syncfs", "rename", "renameat2", "unlink", "ftruncate", "mkdir"]),
            Needs.Tracing),
    ];

    /// <summary>What a call can fail of.</summary>
    private static string[] Kinds(string call) => call switch
    {
        "fsync" or "fdatasync" or "syncfs" or "unlink" => ["EIO", Kill],
        "ftruncate" or "mkdir" => ["ENOSPC", Kill],
        _ => ["ENOSPC", "EIO", Kill],
    };

    private static void Run(Trial trial, IReadOnlyList<string> calls)
    {
        var work = new WorkList<Fault>(() => Faults(trial, calls));
        Parallel.For(0, Workers, Trial.TwoAtOnce, _ =>
        {
            using var desk = MailDesk.Open(trial, take: "move");
            work.Each(fault => Trial.Named($"{fault.Kind} at {fault.Call} {fault.Number}", () => Disturb(trial, desk, fault)));
        });
        if (calls.SelectMany(Kinds).Distinct(StringComparer.Ordinal).Except(trial.Figures.Keys, StringComparer.Ordinal).FirstOrDefault() is { } never)
        {
            throw new ChaosFailureException($"not one call came to {never}");
        }
    }

    /// <summary>Every call of an undisturbed sweep that touches the place, by its number on its thread, with what it is to fail of.</summary>
    private static IEnumerable<Fault> Faults(Trial trial, IReadOnlyList<string> calls)
    {
        using var desk = MailDesk.Open(trial, take: "move");
        using var place = desk.Night();
        var tracer = new Tracer(place.At("trace.txt"), calls.Contains("openat", StringComparer.Ordinal));
        Place.MustEndWell(place.StartUnder(tracer.Words(null), place.SweepWords).WaitForEnd());
        var traced = tracer.Read();
        DurabilityOrder.MustHold(place, traced);
        return
        [
            .. traced.Where(call => calls.Contains(call.Name, StringComparer.Ordinal))
                .GroupBy(call => (call.Thread, call.Name))
                .SelectMany(same => same.Select((call, at) => (call, Number: at + 1)))
                .Where(numbered => numbered.call.Names(place.Root + "/") && (trial.IsLong || !numbered.call.Names("O_RDONLY") || numbered.call.Names("O_CREAT")))
                .SelectMany(numbered => KindsOf(trial, numbered.call.Name, numbered.Number).Select(kind => new Fault(numbered.call.Name, kind, numbered.Number)))
                .Distinct(),
        ];
    }

    /// <summary>
    /// The short column tries each call with one kind of failure only, another one with another seed, and of the writes, which are many, every third; a sync
    /// always fails there, since a kill at it leaves what one at the write before it leaves.
    /// </summary>
    private static IEnumerable<string> KindsOf(Trial trial, string call, int number) => Kinds(call) switch
    {
        var kinds when trial.IsLong => kinds,
        var kinds when IsSync(call) => [kinds[0]],
        var kinds when !Writes.Contains(call, StringComparer.Ordinal) => [kinds[(number + trial.Seed) % kinds.Length]],
        var kinds => (number + trial.Seed) % WritesTried == 0 ? [kinds[(number + trial.Seed) / WritesTried % kinds.Length]] : [],
    };

    private static bool IsSync(string call) => call is "fsync" or "fdatasync" or "syncfs";

    private static void Disturb(Trial trial, MailDesk desk, Fault fault)
    {
        using var place = desk.Night();
        var tracer = new Tracer(place.At("trace.txt"), fault.Call == "openat");
        var ended = place.StartUnder(tracer.Words(fault.Injection), place.SweepWords).WaitForEnd();
        var calls = tracer.Read();
        File.Delete(place.At("trace.txt"));
        DurabilityOrder.MustHold(place, calls);
        if (fault.Kind == Kill ? ended.Code == Ended.Killed : calls.Any(call => call.IsInjected))
        {
            MustEndAsPromised(ended, fault, calls);
            trial.Survived();
            trial.Figure(fault.Kind, 1);
        }
        else
        {
            // A thread that made that many calls the first time made fewer now.
            trial.Figure("not reached", 1);
        }

        trial.Figure("further copies of a mail", desk.MustSendTheRest(place, furtherCopies: 1, skipsWaits: fault.Kind != Kill));
    }

    /// <summary>Rolled back and gone on, or ended as a disk's trouble; a sync of the database that failed always ends the process (T4).</summary>
    private static void MustEndAsPromised(Ended ended, Fault fault, IReadOnlyList<TracedCall> calls)
    {
        var struck = calls.Where(call => call.IsInjected).Select(call => call.Text).ToList();
        var mustEnd = calls.Any(call => call.IsInjected && call.Name is "fsync" or "fdatasync" && call.Names("/loadwatch.db"));
        var isPromised = (fault.Kind, mustEnd) switch
        {
            (Kill, _) => ended.Code == Ended.Killed,
            (_, true) => ended.Code == InputOutput,
            _ => ended.Code is 0 or InputOutput or CannotCreate,
        };
        if (!isPromised)
        {
            throw new ChaosFailureException($"ended with {ended.Code} after {string.Join("; ", struck)}: {ended.Said}");
        }
    }

    private sealed record Fault(string Call, string Kind, int Number)
    {
        public string Injection => FormattableString.Invariant($"{Call}:{(Kind == Kill ? "signal=KILL" : $"error={Kind}")}:when={Number}");
    }
}
