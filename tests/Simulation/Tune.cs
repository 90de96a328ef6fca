using LoadWatch.Findings;
using LoadWatch.Simulation.Counts;
using LoadWatch.Simulation.Nights;
using LoadWatch.Simulation.Worlds;

namespace LoadWatch.Simulation;

internal static class Tune
{
    public static void Run(string only)
    {
        var d = new RuleLimits { Monotony = new() { Enabled = !only.Contains("clinic", StringComparison.Ordinal) } };
        RuleLimits With(double ratio, double jump, double usual, int on, double spike, double run, double fall, int missed, int extra, int poor, double low) => d with
        {
            LoadRatio = d.LoadRatio with { Raise = ratio },
            WeeklyJump = d.WeeklyJump with { Raise = jump, UsualFactor = usual, OnDays = on },
            SessionSpike = d.SessionSpike with { LoadNotice = spike, RunNotice = run },
            FallingLoad = d.FallingLoad with { Notice = fall },
            Silence = d.Silence with { PlannedMissed = missed, ExtraDays = extra },
            NotUsable = d.NotUsable with { Sessions = poor },
            StimulusLow = d.StimulusLow with { UsualShare = low },
        };
        var sets = new List<(string, RuleLimits)>
        {
            ("S0", d),
            ("S1", With(2.0, .5, 1.4, 2, .5, .2, .55, 3, 3, 3, .4)),
            ("S2", With(2.2, .6, 1.5, 2, .6, .3, .5, 3, 4, 3, .35)),
            ("S3", With(2.5, .6, 1.6, 3, .7, .4, .45, 4, 5, 4, .3)),
        };
        foreach (var habits in new[] { Habits.Squad, Habits.Runners, Habits.Clinic }.Where(one => only.Contains(one.Name, StringComparison.Ordinal)))
        {
            foreach (var (name, limits) in sets)
            {
                var maker = new WorldMaker(1, habits, new Noise(), limits);
                var world = maker.Healthy(80, 100);
                var healthy = Season.Of(world, habits.Sport, new Course { KnownThrough = world.Last });
                var rules = string.Join(' ', Score.FalseAlerts(healthy).GroupBy(alert => alert.Key.Rule).OrderByDescending(rule => rule.Count()).Select(rule => $"{rule.Key} {rule.Count() / 80.0:0.00}"));
                var with = maker.WithEpisodes(100, 100, [HappeningKind.DoubleWeek, HappeningKind.DoubleSession, HappeningKind.NothingHeavy, HappeningKind.Fade]);
                var season = Season.Of(with, habits.Sport, new Course { KnownThrough = with.Last });
                var found = Score.Episodes(season);
                Console.WriteLine($"{habits.Name} {name}: {Score.FalsePerPersonAnd100Days(healthy):0.00} chatter {Score.Chatter(healthy)} = {rules}");
                Console.WriteLine($"      {string.Join(' ', found.Select(one => $"{one.Kind} {one.Times}/{one.Episodes}"))}; DoubleWeek by " + string.Join(' ', season.People
                    .SelectMany(person => person.Truth.Happenings.Where(one => one.Kind is HappeningKind.DoubleWeek or HappeningKind.NothingHeavy).SelectMany(one => Score.Finds(person, one).Select(raise => raise.Key.Rule).Distinct()))
                    .GroupBy(rule => rule).Select(rule => $"{rule.Key} {rule.Count()}")));
            }
        }
    }
}
