using System.Runtime.Versioning;
using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>G8: one service that is never started anew while disk, inbox, database, process and configuration fail one after another and come back.</summary>
public static class LongMorning
{
    /// <summary>sqlite.org, "WAL-mode File Format", section 2.3: the byte of the shared memory that stands for the right to write.</summary>
    private const int WriterLock = 120;

    private const string Settled = "Arrivals settled: 1 stored";
    private static readonly TimeSpan Stopped = TimeSpan.FromSeconds(7);
    private static readonly TimeSpan Free = TimeSpan.FromSeconds(30);
    private static readonly TimeSpan Torn = TimeSpan.FromSeconds(6);

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new(
            "long-morning",
            "C55 D57 A18 D63 G94 G95",
            "One running service sees its disk fill up, its inbox go, its database held, its process stopped and its configuration half written, and each come back: it says so once and goes on by itself, one brief in all.",
            Run,
            Needs.Mounting),
    ];

    private static void Run(Trial trial)
    {
        var nights = new Nights(Clock.Machine, trial.Seed);
        var sessions = new FreeSessions(nights);
        using var place = trial.Prepared(nights, Clock.Machine);
        using var disk = new SmallDisk(place.Data);
        void Drop() => Add(place, nights, sessions.Next("anna"));
        using (var service = ServiceAtWork.Start(place, disk.Words))
        {
            Drop();
            service.MustSay(Settled);
            Step(trial, service, "a full disk", () => disk.LeaveBytes(0), Drop, () => service.MustSay("A sweep failed"), disk.MakeAmple);
            Step(trial, service, "no inbox", () => Directory.Move(place.Inbox, place.At("aside")), () => service.MustSay("not available"), () => Directory.Move(place.At("aside"), place.Inbox), Drop);
            Step(trial, service, "a database that is held", () => Hold(disk, place, () =>
            {
                Drop();
                service.MustSay("Another program holds the database");
            }));
            Step(trial, service, "a stopped process", () => service.Process.Signal("STOP"), Drop, () => Thread.Sleep(Stopped), () => service.Process.Signal("CONT"));
            Step(trial, service, "a configuration half written", () => Tear(place, () =>
            {
                Drop();
                service.MustSay("The configuration has");
                Thread.Sleep(Torn);
            }));
            service.Stop();
        }

        disk.BringBack();
        Trial.MustBe(2, StoreDump.Lines(place.DatabasePath).Count(line => line.StartsWith("notice|", StringComparison.Ordinal)), "briefs of yesterday and today");
        Trial.Sound(place, nights.Truth);
    }

    private static void Step(Trial trial, ServiceAtWork service, string what, params IEnumerable<Action> actions) => Trial.Named(what, () =>
    {
        foreach (var action in actions)
        {
            action();
        }

        service.MustSay(Settled);
        trial.Survived();
    });

    /// <summary>Takes the lock that whoever writes takes; by hand, since the engine would look for the file where nothing is mounted.</summary>
    private static void Hold(SmallDisk disk, Place place, Action meanwhile)
    {
        using var shared = new FileStream(disk.Outside(place.DatabasePath + "-shm"), FileMode.Open, FileAccess.ReadWrite, FileShare.ReadWrite);
        if (!SpinWait.SpinUntil(() => OperatingSystem.IsLinux() && TryLock(shared), Free))
        {
            throw new ChaosFailureException("the database is never free");
        }

        meanwhile();
    }

    [SupportedOSPlatform("linux")]
    private static bool TryLock(FileStream shared)
    {
        try
        {
            shared.Lock(WriterLock, 1);
            return true;
        }
        catch (IOException)
        {
            return false;
        }
    }

    /// <summary>Writes halves and wholes of the configuration in turn; ends with the whole.</summary>
    private static void Tear(Place place, Action meanwhile)
    {
        var whole = File.ReadAllText(place.ConfigPath);
        using var ends = new CancellationTokenSource();
        var writer = new Thread(() =>
        {
            for (var turn = 0; !ends.IsCancellationRequested; turn++)
            {
                File.WriteAllText(place.ConfigPath, whole[..(whole.Length * (turn % 10) / 10)]);
            }
        });
        writer.Start();
        try
        {
            meanwhile();
        }
        finally
        {
            ends.Cancel();
            writer.Join();
            File.WriteAllText(place.ConfigPath, whole);
        }
    }

    private static void Add(Place place, Nights nights, TrueSession session) =>
        place.Put($"anna/{session.Date:uuuu-MM-dd}.fit", nights.Truth.Must(Truth.Stored, Files.Fit(session)));
}
