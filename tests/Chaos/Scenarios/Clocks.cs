using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;
using NodaTime;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Clocks that step, people who travel, files that come late: section C of the catalogue. Zones and their rules are proved in process.</summary>
public static class Clocks
{
    private const string Behind = "nothing is done until the clock is right";

    private static readonly TimeSpan TenYears = TimeSpan.FromDays(3652);

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("clock-steps", "C48 C49", "Started in 1971; then the clock steps back an hour, back ten years and on by a day while files come: nothing is done by a clock that is behind, all of it once it is right, and no brief twice.", Steps, Needs.Faking),
        new("travellers", "C52", "A session in Auckland and one in Los Angeles of the same local Monday, then a week that lacks its Thursday: each on its own local date, once.", Travellers),
        new("late-files", "C56", "Five weeks of files, the late ones first, over four sweeps: the same values as all of them at once, in order.", Late),
    ];

    private static void Steps(Trial trial)
    {
        var nights = new Nights(Clock.Machine, trial.Seed);
        var sessions = new FreeSessions(nights);
        using var place = trial.Prepared(nights, Clock.Machine);
        var time = new FakeTime(place.At("time"));
        Add(place, nights, sessions);
        place.SweepWell();
        time.Set(-TenYears * 5.5);
        Add(place, nights, sessions);
        using (var service = ServiceAtWork.Start(place, [], time.Environment))
        {
            service.MustSay(Behind);
            time.Set(TimeSpan.Zero);
            service.MustSay("Arrivals settled: 1 stored");
            trial.Survived();
            foreach (var step in new[] { TimeSpan.FromMinutes(-61), -TenYears })
            {
                time.Set(step);
                service.MustSay(Behind);
                Add(place, nights, sessions);
                time.Set(TimeSpan.Zero);
                service.MustSay("Arrivals settled: 1 stored");
                trial.Survived();
            }

            Trial.MustBe(2, Briefs(place), "briefs of yesterday and today after steps back");
            Add(place, nights, sessions);
            time.Set(TimeSpan.FromDays(1));
            service.MustSay("Arrivals settled: 1 stored");
            time.Set(TimeSpan.Zero);
            service.MustSay(Behind);
            trial.Survived();
            service.Stop();
        }

        Trial.MustBe(3, Briefs(place), "briefs of three dates");
        Trial.Sound(place, nights.Truth);
    }

    private static int Briefs(Place place) => StoreDump.Lines(place.DatabasePath).Count(line => line.StartsWith("notice|", StringComparison.Ordinal));

    private static void Add(Place place, Nights nights, FreeSessions sessions)
    {
        var session = sessions.Next("anna");
        place.Put($"anna/{session.Date:uuuu-MM-dd}.fit", nights.Truth.Must(Truth.Stored, Files.Fit(session)));
    }

    private static void Travellers(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Fixed);
        var random = new Random(trial.Seed);
        var (auckland, angeles) = (DateTimeZoneProviders.Tzdb["Pacific/Auckland"], DateTimeZoneProviders.Tzdb["America/Los_Angeles"]);
        var monday = new LocalDate(2026, 6, 1);
        (LocalDate, LocalTime, DateTimeZone)[] trips =
        [
            (monday, new LocalTime(9, 0), auckland), (monday, new LocalTime(17, 0), angeles),
            (monday.PlusDays(2), new LocalTime(20, 0), angeles), (monday.PlusDays(4), new LocalTime(10, 0), auckland),
        ];
        foreach (var (date, at, zone) in trips)
        {
            var session = nights.Truth.Happened(TrueSession.Make("anna", date, at, zone, random));
            place.Put($"anna/{date:uuuu-MM-dd} {zone.Id[..2]}.fit", nights.Truth.Must(Truth.Stored, Files.Fit(session)));
            var other = nights.Truth.Happened(TrueSession.Make("cara", date, at, zone, random));
            place.Put($"cara/{date:uuuu-MM-dd} {zone.Id[..2]}.csv", nights.Truth.Must(Truth.Stored, Files.Csv(other)));
        }

        place.SweepWell();
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    }

    private static void Late(Trial trial)
    {
        const int Days = 36;
        var nights = new Nights(Clock.Fixed, trial.Seed);
        foreach (var ago in Enumerable.Range(0, Days))
        {
            nights.Add($"anna/{ago}.fit", Files.Fit(nights.Session("anna", ago)), Truth.Stored);
        }

        using var place = trial.Prepared(nights, Clock.Fixed);
        using var atOnce = place.Copy();
        atOnce.Fill(nights.Tonight);
        atOnce.SweepWell();
        var wanted = Values.Of(atOnce);
        var random = new Random(trial.Seed);
        foreach (var some in nights.Tonight.OrderBy(_ => random.Next()).Chunk(Days / 4))
        {
            place.Fill(some);
            place.SweepWell();
            trial.Survived();
        }

        Values.MustEqual(Values.Of(place), wanted);
        Trial.Sound(place, nights.Truth);
    }
}
