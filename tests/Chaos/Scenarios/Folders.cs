using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Faults of the inbox itself: replaced, away, closed, read-only, without events: section A of the catalogue.</summary>
public static class Folders
{
    private const string NotAvailable = "not available";

    /// <summary>root without the right to read everything, so that modes count for it.</summary>
    private static readonly string[] WithoutOverride = ["setpriv", "--bounding-set=-dac_override,-dac_read_search"];

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("inbox-replaced", "A18 A20", "The inbox is mounted over, unmounted, moved away, made anew, closed to the service: said so, nothing forgotten, and taken up again where it is back.", Replaced, Needs.Mounting),
        new("inbox-marker", "A19", "The share is not mounted at the start: its marker is missing, so what lies in the mount point is left alone until it is there.", Marked, Needs.Mounting),
        new("inbox-read-only", "A22 A23", "The inbox is read-only or on another disk while the archive is full: each effect once, the source stays until it may go.", ReadOnly, Needs.Mounting),
        new("no-folder-events", "A15 A16 A17", "No handles for folder events, then no room for watches: one line, and the scan finds what comes.", WithoutEvents, Needs.Tracing),
    ];

    private static void Replaced(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        var sessions = new FreeSessions(nights);
        using var place = trial.Prepared(nights, Clock.Fixed);
        using var room = new MountRoom();
        var dropped = "";
        void Drop() => dropped = Add(place, nights, sessions.Next("anna"));
        Drop();
        MustBeThere(place, room.Words);
        Disturb(trial, "mounted over", () => room.Mount("-t", "tmpfs", "chaos", place.Inbox), () => MustBeAway(place, room.Words), () => room.Unmount(place.Inbox), Drop, () => MustBeThere(place, room.Words));
        Disturb(trial, "moved away", () => Directory.Move(place.Inbox, place.At("aside")), () => MustBeAway(place, room.Words), () => Directory.Move(place.At("aside"), place.Inbox), Drop, () => MustBeThere(place, room.Words));
        Disturb(trial, "made anew", () => Directory.Move(place.Inbox, place.At("old")), Drop, () => MustBeThere(place, room.Words));
        Disturb(trial, "closed", () => Close(place.Inbox), () => MustBeAway(place, WithoutOverride), () => Open(place.Inbox), Drop, () => MustBeThere(place, WithoutOverride));
        Disturb(trial, "a file closed", Drop, () => Close(dropped), () => Trial.MustSay(place.StartUnder(WithoutOverride, place.SweepWords).WaitForEnd().Errors, "no right to read it"), () => Open(dropped), () => MustBeThere(place, WithoutOverride));
        foreach (var mode in new[] { "000", "400", "100" })
        {
            Disturb(
                trial,
                $"a person's folder with the mode {mode}",
                Drop,
                () => Tool.Run("chmod", mode, Path.Combine(place.Inbox, "anna")),
                () => Trial.MustSay(place.StartUnder(WithoutOverride, place.SweepWords).WaitForEnd().Errors, "anna/: there is no right to look into this folder"),
                () => Open(Path.Combine(place.Inbox, "anna")),
                () => MustBeThere(place, WithoutOverride));
        }

        Directory.Delete(place.At("old"), recursive: true);
        Trial.Sound(place, nights.Truth);
    }

    private static void Marked(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Fixed);
        File.WriteAllText(place.ConfigPath, File.ReadAllText(place.ConfigPath).Replace("\"take\": \"leave\"", "\"take\": \"leave\", \"marker\": \".share\"", StringComparison.Ordinal));
        using var room = new MountRoom();
        var stray = place.Put("anna/not yet.fit", Files.Fit(TrueSession.Make("anna", Clock.Fixed.Today.PlusDays(-30), new NodaTime.LocalTime(12, 0), Clock.Fixed.TimeZone, new Random(1))));
        Trial.MustSay(MustBeAway(place, room.Words), ".share");
        File.Delete(stray);
        var ride = nights.Add("anna/ride.fit", Files.Fit(nights.Session("anna", 0)), Truth.Stored);
        room.Mount("-t", "tmpfs", "chaos", place.Inbox);
        room.Do("mkdir", Path.Combine(place.Inbox, "anna"));
        File.WriteAllText(room.Outside(Path.Combine(place.Inbox, ".share")), "");
        File.WriteAllBytes(room.Outside(Path.Combine(place.Inbox, "anna/ride.fit")), ride);
        File.SetLastWriteTimeUtc(room.Outside(Path.Combine(place.Inbox, "anna/ride.fit")), (place.Clock.Now - NodaTime.Duration.FromHours(1)).ToDateTimeUtc());
        MustBeThere(place, room.Words);
        room.Unmount(place.Inbox);
        MustBeAway(place, room.Words);
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    }

    private static void ReadOnly(Trial trial)
    {
        var nights = Nights.OneFile(Clock.Fixed, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Fixed, new PlaceOptions(Take: "move"));
        var undisturbed = Trial.Undisturbed(place, nights);
        using var room = new MountRoom();
        room.Mount("--bind", place.Inbox, place.Inbox);
        room.Mount("-o", "remount,ro,bind", place.Inbox);
        place.Fill(nights.Tonight);
        Trial.MustBe(2, Enumerable.Range(0, 2).Count(_ => Sweep(place, room.Words).Code == 0), "sweeps of a read-only inbox that ended well");
        Trial.MustBe(1, FilesIn(place), "files in a read-only inbox");
        room.Unmount(place.Inbox);

        using (var disk = new SmallDisk(Path.Combine(place.Data, "archive")))
        {
            place.Put("anna/another.fit", Files.Fit(TrueSession.Make("anna", Clock.Fixed.Today.PlusDays(-3), new NodaTime.LocalTime(12, 0), Clock.Fixed.TimeZone, new Random(1))));
            disk.LeaveBytes(0);
            Sweep(place, disk.Words);
            Trial.MustBe(1, Directory.EnumerateFiles(place.Inbox, "another.fit", SearchOption.AllDirectories).Count(), "sources left while the archive is full");
            disk.MakeAmple();
            File.Delete(Path.Combine(place.Inbox, "anna/another.fit"));
            disk.BringBack();
        }

        Trial.MustConverge(place, undisturbed);
        Trial.MustBe(0, FilesIn(place), "files in an inbox that may be emptied again");
        trial.Survived();
    }

    private static void WithoutEvents(Trial trial) => Parallel.ForEach(new[] { "inotify_init1:error=EMFILE", "inotify_add_watch:error=ENOSPC" }, Trial.TwoAtOnce, injection =>
    {
        var nights = new Nights(Clock.Machine, trial.Seed);
        var sessions = new FreeSessions(nights);
        using var place = trial.Prepared(nights, Clock.Machine);
        Add(place, nights, sessions.Next("anna"));
        string[] tracer = ["strace", "-D", "-f", "--seccomp-bpf", "-e", $"trace={injection.Split(':')[0]}", "-e", $"inject={injection}", "-o", "/dev/null"];
        using var service = ServiceAtWork.Start(place, tracer);
        service.MustSay("Arrivals settled: 1 stored");
        service.MustSay("Folder events are not to be had");
        Add(place, nights, sessions.Next("anna"));
        service.MustSay("Arrivals settled: 1 stored");
        Trial.MustBe(1, service.Count("Folder events are not to be had"), "lines about events");
        service.Stop();
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    });

    private static void Disturb(Trial trial, string what, params IEnumerable<Action> steps)
    {
        Trial.Named(what, () =>
        {
            foreach (var step in steps)
            {
                step();
            }
        });
        trial.Survived();
    }

    private static string Add(Place place, Nights nights, TrueSession session) => place.Put(
        $"{session.Person}/{session.Local.Date:uuuu-MM-dd} {session.Local.Minute}.fit", nights.Truth.Must(Truth.Stored, Files.Fit(session)));

    private static Ended Sweep(Place place, IEnumerable<string> under) => place.StartUnder(under, place.SweepWords).WaitForEnd();

    private static string MustBeAway(Place place, IEnumerable<string> under)
    {
        var said = Place.MustEndWell(Sweep(place, under)).Errors;
        Trial.MustSay(said, NotAvailable);
        return said;
    }

    private static void MustBeThere(Place place, IEnumerable<string> under)
    {
        var said = Place.MustEndWell(Sweep(place, under)).Errors;
        Trial.MustBe(0, said.Length, "letters of trouble with a good inbox: " + said);
    }

    private static long FilesIn(Place place) => Directory.EnumerateFiles(place.Inbox, "*", SearchOption.AllDirectories).LongCount();

    private static void Close(string path) => Tool.Run("chmod", "000", path);

    private static void Open(string path) => Tool.Run("chmod", "755", path);
}
