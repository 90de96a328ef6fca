using System.Globalization;
using LoadWatch.Findings;
using LoadWatch.Simulation.Counts;
using LoadWatch.Simulation.Nights;
using LoadWatch.Simulation.Worlds;

namespace LoadWatch.Simulation;

/// <summary>The tables, in the order in which <c>tests/README.md</c> keeps them.</summary>
/// <param name="seeds">Counted together.</param>
/// <param name="people">Of a squad; of runners and members as many.</param>
/// <param name="days">Counted days.</param>
/// <param name="quick">The built-in limits alone, not those before them.</param>
public sealed class Report(IReadOnlyList<int> seeds, int people, int days, bool quick, TextWriter output)
{
    private static readonly Habits[] Groups = [Habits.Squad, Habits.Runners, Habits.Clinic];

    private static readonly (string Name, Func<Habits, RuleLimits> Of)[] Sets = [("before", Limits.Before), ("built in", Limits.BuiltIn)];

    public void Healthy()
    {
        Row("people", "limits", "false alerts a person and 100 days", "worst seed", "of them", "chatter", "rows a day", "95 % of days");
        Row("---", "---", "---", "---", "---", "---", "---", "---");
        foreach (var (habits, set, limits) in Combinations())
        {
            var seasons = Seasons(seed => Maker(seed, habits, limits).Healthy(people, days), habits);
            var rows = seasons.SelectMany(Score.Rows).Order().ToList();
            Row(
                $"{people} {habits.Name}",
                set,
                Number(seasons.Average(Score.FalsePerPersonAnd100Days)),
                Number(seasons.Max(Score.FalsePerPersonAnd100Days)),
                OfThem(seasons),
                Count(seasons.Sum(Score.Wavering)),
                Number(rows.Average()),
                Count(rows[(int)(0.95 * (rows.Count - 1))]));
        }
    }

    public void Episodes()
    {
        Row("people", "limits", "episode", "found", "share", "median days");
        Row("---", "---", "---", "---", "---", "---");
        foreach (var (habits, set, limits) in Combinations())
        {
            foreach (var found in Score.Episodes(Seasons(seed => Maker(seed, habits, limits).WithEpisodes(people * 2, days), habits)))
            {
                Row(habits.Name, set, Words(found.Kind), $"{Count(found.Times)} of {Count(found.Episodes)}", $"{Count(100 * found.Times / found.Episodes)} %", found.MedianDays is { } median ? Count(median) : "-");
            }
        }
    }

    /// <summary>The same squad and days, looked at in another course of the service.</summary>
    public void Courses()
    {
        var habits = Habits.Squad;
        var worlds = seeds.Select(seed => Maker(seed, habits, Limits.BuiltIn(habits)).Healthy(people, days)).ToList();
        var usual = worlds.ConvertAll(world => Score.CountedRaises(Season.Of(world, habits.Sport)));
        Row("course of the service", "alerts", "other than in the usual course");
        Row("---", "---", "---");
        foreach (var (name, course) in new (string, Course)[]
        {
            ("the usual one", new Course()),
            ("started anew every night, nothing computed before", new Course { FromNothing = true }),
            ("nobody ever says that anything was seen", new Course { StaffAnswer = false }),
            ("two sweeps a night", new Course { TimesANight = 2 }),
            ("all that came before comes in the night before", new Course { NightsBefore = 1 }),
        })
        {
            var raises = worlds.ConvertAll(world => Score.CountedRaises(Season.Of(world, habits.Sport, course)));
            Row(name, Count(raises.Sum(one => one.Count)), Count(raises.Zip(usual, (one, other) => one.Except(other).Count() + other.Except(one).Count()).Sum()));
        }
    }

    public void Disturbances()
    {
        Row("people", "what disturbs", "limits", "false alerts a person and 100 days", "of them", "chatter");
        Row("---", "---", "---", "---", "---", "---");

        // Nights enough to know how late files usually come.
        var settled = new Course { NightsBefore = 42 };
        foreach (var habits in Groups)
        {
            foreach (var (name, noise) in new (string, Noise)[]
            {
                ("as above", new Noise()),
                ("every recording on its day", new Noise { Late = 0 }),
                ("half of the recordings up to 6 days late", new Noise { Late = 0.5, LateDays = 6 }),
                ("devices read out every 4 days", new Noise { Late = 0, SyncDays = 4 }),
            })
            {
                Disturbed(habits, name, "built in, without waiting for late files", Limits.BuiltIn(habits), noise, settled with { WaitsForLateFiles = false });
                Disturbed(habits, name, "built in", Limits.BuiltIn(habits), noise, settled);
            }
        }

        var squad = Habits.Squad;
        foreach (var (name, noise) in new (string, Noise)[]
        {
            ("nothing missing", new Noise { Missing = 0 }),
            ("30 % of the days missing", new Noise { Missing = 0.3 }),
            ("no sensor fails", new Noise { Faults = 0 }),
        })
        {
            Disturbed(squad, name, "built in", Limits.BuiltIn(squad), noise);
        }

        Disturbed(squad, "as above", "built in, without deadband and delays", Limits.WithoutDeadband(Limits.BuiltIn(squad)), new Noise());
        Disturbed(squad, "as above", "before", Limits.Before(squad), new Noise());
        Disturbed(squad, "as above", "before, without deadband and delays", Limits.WithoutDeadband(Limits.Before(squad)), new Noise());
    }

    public void Clinic(int members)
    {
        var habits = Habits.Clinic;
        var seasons = seeds
            .Select(seed => Season.Of(Maker(seed, habits, Limits.BuiltIn(habits)).WithAway(members, 42, 0.2), habits.Sport, new Course { NightsBefore = 7 }))
            .ToList();
        Row("clinic", "named a day, at most", "named or counted, mean", "at most");
        Row("---", "---", "---", "---");
        Row(
            $"{Count(members)} members, 20 % away for three weeks and nobody told",
            Count(seasons.Max(season => season.Briefs.Max(brief => brief.Flagged.Count))),
            Number(seasons.SelectMany(Score.Rows).Average()),
            Count(seasons.SelectMany(Score.Rows).Max()));
    }

    private void Disturbed(Habits habits, string name, string set, RuleLimits limits, Noise noise, Course? course = null)
    {
        var seasons = Seasons(seed => new WorldMaker(seed, habits, noise, limits).Healthy(people, days), habits, course);
        Row(habits.Name, name, set, Number(seasons.Average(Score.FalsePerPersonAnd100Days)), OfThem(seasons), Count(seasons.Sum(Score.Wavering)));
    }

    private string OfThem(List<SeasonResult> seasons) => string.Join(", ", seasons.SelectMany(Score.FalseAlerts)
        .GroupBy(raise => raise.Key.Rule, StringComparer.Ordinal)
        .OrderByDescending(rule => rule.Count())
        .ThenBy(rule => rule.Key, StringComparer.Ordinal)
        .Select(rule => $"{rule.Key} {Number(100.0 * rule.Count() / people / days / seeds.Count)}"));

    private List<SeasonResult> Seasons(Func<int, World> world, Habits habits, Course? course = null) => [.. seeds.Select(seed => Season.Of(world(seed), habits.Sport, course))];

    private IEnumerable<(Habits Habits, string Set, RuleLimits Limits)> Combinations() =>
        Groups.SelectMany(habits => Sets.Skip(quick ? 1 : 0).Select(set => (habits, set.Name, set.Of(habits))));

    private static WorldMaker Maker(int seed, Habits habits, RuleLimits limits) => new(seed, habits, new Noise(), limits);

    private static string Words(HappeningKind kind) => kind switch
    {
        HappeningKind.DoubleWeek => "a week twice as large",
        HappeningKind.DoubleSession => "a session twice the longest of 30 days",
        HappeningKind.NothingHeavy => "14 days without heavy or fast leg work",
        _ => "a fade to 40 %",
    };

    private static string Number(double value) => value.ToString("0.00", CultureInfo.InvariantCulture);

    private static string Count(int value) => value.ToString(CultureInfo.InvariantCulture);

    private void Row(params string[] cells) => output.WriteLine($"| {string.Join(" | ", cells)} |");
}
