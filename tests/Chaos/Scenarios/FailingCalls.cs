using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Mail;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>
/// While one FIT file is taken in and one mail leaves, the n-th call that changes files fails, or the process is killed at it, for every n until a run passes
/// untouched. The next sweep must end where an undisturbed one does.
/// </summary>
public static class FailingCalls
{
    private const int InputOutput = 74;
    private const int CannotCreate = 73;

    /// <summary>Calls with what each can fail of.</summary>
    private static readonly (string Call, string Fault)[] Faults =
    [
        .. new[] { "pwrite64", "openat", "rename", "renameat2", "mkdir" }.Select(call => (call, "ENOSPC")),
        .. new[] { "pwrite64", "openat", "rename", "renameat2", "unlink", "fsync", "fdatasync", "ftruncate" }.Select(call => (call, "EIO")),
    ];

    private static readonly string[] Kills = ["pwrite64", "openat", "rename", "renameat2", "unlink", "fsync", "fdatasync", "ftruncate", "mkdir"];

    public static IReadOnlyList<Scenario> All { get; } =
    [
        Scenario("failing-space", "D57", "ENOSPC", "The disk is full"),
        Scenario("failing-disk", "D59", "EIO", "The disk fails"),
        new("failing-kill", "D61", "Killed at every single call that changes files while one file comes in and one mail leaves.", trial => Run(trial, Kills.Select(call => (call, "KILL"))), Needs.Tracing),
    ];

    private static Scenario Scenario(string id, string faults, string error, string what) => new(
        id,
        faults,
        $"{what} at every single call while one file comes in and one mail leaves: rolled back or ended with 74, and right at the next sweep.",
        trial => Run(trial, Faults.Where(fault => fault.Fault == error)),
        Needs.Tracing);

    private static void Run(Trial trial, IEnumerable<(string Call, string Fault)> faults)
    {
        var nights = Nights.OneFile(Clock.Machine, trial.Seed);
        Parallel.ForEach(faults, Trial.TwoAtOnce, fault =>
        {
            using var server = new ScriptedServer();
            using var prepared = trial.Prepared(nights, Clock.Machine, new PlaceOptions(Take: "move", Mail: server.Section));
            var mails = new MailCheck(server);
            var undisturbed = mails.Undisturbed(() => Trial.Undisturbed(prepared, nights));
            prepared.Fill(nights.Tonight);
            var (first, last) = OfPlace(prepared, fault.Call);
            for (var n = first; n <= last; n++)
            {
                server.Forget();
                using var place = prepared.Copy();
                var at = $"{fault.Fault} at {fault.Call} {n}";
                if (!Trial.Named(at, () => Disturbed(place, fault, n)))
                {
                    break;
                }

                if (fault.Fault != "KILL")
                {
                    place.SkipWaits();
                }

                Trial.Named(at, () => Trial.MustConverge(place, undisturbed));
                trial.Figure("further copies of a mail", Trial.Named(at, () => mails.MustHold(atMost: 1)));
                trial.Figure($"{fault.Call} {fault.Fault}", 1);
                trial.Survived();
            }
        });
    }

    /// <summary>The numbers between which calls of that name touch the place; one more than the last shows that a run passes untouched.</summary>
    private static (int First, int Last) OfPlace(Place prepared, string call)
    {
        using var place = prepared.Copy();
        var tracer = new Tracer(place.At("trace.txt"));
        Place.MustEndWell(place.StartUnder(tracer.Words(null), place.SweepWords).WaitForEnd());
        var calls = tracer.Read();
        DurabilityOrder.MustHold(place, calls);

        // Numbers count by thread, and the thread that works on the place is one.
        var numbers = calls.Where(traced => traced.Name == call).GroupBy(traced => traced.Text.Split(' ')[0])
            .SelectMany(thread => thread.Select((traced, at) => (traced, Number: at + 1)))
            .Where(numbered => numbered.traced.Names(place.Root))
            .Select(numbered => numbered.Number)
            .ToList();
        return numbers.Count == 0 ? (1, 0) : (numbers.Min(), numbers.Max() + 1);
    }

    /// <returns>False when the run passed untouched.</returns>
    private static bool Disturbed(Place place, (string Call, string Fault) fault, int n)
    {
        var tracer = new Tracer(place.At("trace.txt"));
        var how = fault.Fault == "KILL" ? "signal=KILL" : $"error={fault.Fault}";
        var ended = place.StartUnder(tracer.Words($"{fault.Call}:{how}:when={n}"), place.SweepWords).WaitForEnd();
        var calls = tracer.Read();
        var struck = calls.Where(call => call.IsInjected).ToList();
        File.Delete(place.At("trace.txt"));
        DurabilityOrder.MustHold(place, calls);
        if (fault.Fault == "KILL")
        {
            return ended.Code == Ended.Killed || (ended.Code == 0 ? false : throw new ChaosFailureException($"ended with {ended.Code}: {ended.Said}"));
        }

        if (struck.Exists(call => call.Names(place.Root)))
        {
            MustEndAsPromised(ended, struck[0]);
        }

        return struck.Count > 0;
    }

    /// <summary>Rolled back and gone on, or ended as a disk's trouble; a sync of the database that failed always ends the process (T4).</summary>
    private static void MustEndAsPromised(Ended ended, TracedCall struck)
    {
        var mustEnd = struck.Name is "fsync" or "fdatasync" && struck.Names("/data/loadwatch.db");
        var isPromised = mustEnd ? ended.Code == InputOutput : ended.Code is 0 or InputOutput or CannotCreate;
        if (!isPromised)
        {
            throw new ChaosFailureException($"ended with {ended.Code} after {struck.Text}: {ended.Said}");
        }
    }
}
