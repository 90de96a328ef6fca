using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Too little memory and too few handles, and calls that come back early: section D of the catalogue.</summary>
public static class Scarcity
{
    private const int Configuration = 78;
    private const int Damaged = 65;
    private const int InputOutput = 74;

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("little-memory", "D73", "A limit on memory ends the sweep wherever it strikes: no file is refused for it, and the next sweep is right.", Memory),
        new("few-handles", "D74", "So few file handles that start or sweep break off somewhere: nothing lost, and the next sweep is right.", Handles),
        new("interrupted-calls", "D60", "Every second write and cut of files is interrupted, then a sync: the first is gone on with as if nothing had been, the second may end it with 74.", Interrupted, Needs.Tracing),
        new("failing-reads", "D59", "A file of the inbox, then the database cannot be read: named, or ended with 65 or 74, and right at the next sweep.", Reads, Needs.Tracing),
        new("network-data-folder", "D70", "The data folder says that it lies on a network file system: 78 and its name; nothing is written.", Network, Needs.Tracing),
    ];

    private static void Memory(Trial trial) => EachLimit(trial, [4, 6, 8, 10, 12, 16], (place, megabytes) =>
        place.Sweep(("DOTNET_GCHeapHardLimit", FormattableString.Invariant($"{megabytes << 20:X}"))).Code);

    private static void Handles(Trial trial) => EachLimit(trial, [60, 100, 120, 140, 160], (place, handles) =>
        place.StartUnder(["prlimit", FormattableString.Invariant($"--nofile={handles}")], place.SweepWords).WaitForEnd().Code);

    private static void EachLimit(Trial trial, IEnumerable<int> limits, Func<Place, int, int> sweep)
    {
        var nights = Nights.Full(Clock.Fixed, trial.Seed);
        using var prepared = trial.Prepared(nights, Clock.Fixed);
        var undisturbed = Trial.Undisturbed(prepared, nights);
        prepared.Fill(nights.Tonight);
        Parallel.ForEach(limits, Trial.TwoAtOnce, limit => Trial.Named($"limit {limit}", () =>
        {
            using var place = prepared.Copy();
            trial.Figure($"ended with {sweep(place, limit)}", 1);
            Trial.MustConverge(place, undisturbed);
            trial.Survived();
        }));
    }

    private static void Interrupted(Trial trial)
    {
        var nights = Nights.Full(Clock.Fixed, trial.Seed);
        using var prepared = trial.Prepared(nights, Clock.Fixed, new PlaceOptions(Take: "move"));
        var undisturbed = Trial.Undisturbed(prepared, nights);
        prepared.Fill(nights.Tonight);

        // The engine takes an interrupted sync for a failed one.
        foreach (var (injection, mayEnd) in new[] { ("pwrite64,ftruncate:error=EINTR:when=2+2", false), ("fsync,fdatasync:error=EINTR:when=3", true) })
        {
            using var place = prepared.Copy();
            var ended = place.StartUnder(Strace(place, injection), place.SweepWords).WaitForEnd();
            Trial.MustBe(mayEnd && ended.Code != 0 ? InputOutput : 0, ended.Code, $"as the exit code of {injection} ({ended.Said})");
            trial.Figure("interrupted calls", File.ReadLines(place.At("trace.txt")).Count(line => line.Contains("(INJECTED)", StringComparison.Ordinal)));
            Trial.MustConverge(place, undisturbed);
            trial.Survived();
        }
    }

    private static void Reads(Trial trial)
    {
        var nights = Nights.OneFile(Clock.Fixed, trial.Seed);
        using var prepared = trial.Prepared(nights, Clock.Fixed);
        prepared.Fill(nights.Tonight);
        using var undisturbed = prepared.Copy();
        undisturbed.SweepWell();

        // The engine takes a page that cannot be read for a damaged one.
        foreach (var (path, codes) in new (string, int[])[] { ("inbox/anna/ride.fit", [0]), ("data/loadwatch.db", [Damaged, InputOutput]) })
        {
            foreach (var when in new[] { "1+", "2+", "5+" })
            {
                using var place = prepared.Copy();
                var ended = place.StartUnder(Strace(place, $"pread64,read,readv,preadv:error=EIO:when={when}", path), place.SweepWords).WaitForEnd();
                var struck = File.ReadAllText(place.At("trace.txt")).Contains("(INJECTED)", StringComparison.Ordinal);
                Trial.MustBe(struck && codes.Contains(ended.Code) ? ended.Code : struck ? codes[0] : 0, ended.Code, $"as the exit code where {path} cannot be read from the read {when} on ({ended.Said})");
                if (struck && ended.Code == 0)
                {
                    Trial.MustSay(ended.Errors, "ride.fit");
                }

                // The brief may have told by now that a file cannot be read.
                place.SweepWell();
                Trial.Named($"{path} from the read {when} on", () => Values.MustEqual(Values.Of(place), Values.Of(undisturbed)));
                trial.Survived();
            }
        }
    }

    private static void Network(Trial trial)
    {
        // The type of statfs(2) is put in by the tracer: nfs.
        using var place = trial.NewPlace(Clock.Fixed);
        var ended = place.StartUnder(Strace(place, "statfs:retval=0:poke_exit=@arg2=6969000000000000"), place.SweepWords).WaitForEnd();
        Trial.MustBe(Configuration, ended.Code, $"as the exit code ({ended.Said})");
        Trial.MustSay(ended.Errors, "network file system (nfs)");
        Trial.MustBe(0, Directory.Exists(place.Data) ? 1 : 0, "data folders on a share");
        trial.Survived();
    }

    private static IEnumerable<string> Strace(Place place, string injection, string? only = null) =>
    [
        "strace", "-f", "-y", .. only is null ? ["--seccomp-bpf"] : new[] { "-P", place.At(only) }, "-e", $"trace={injection.Split(':')[0]}", "-e", $"inject={injection}", "-o", place.At("trace.txt"),
    ];
}
