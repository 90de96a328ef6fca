using LoadWatch.Loads;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Simulation.Worlds;

/// <summary>What people of a kind do in a week. Invented, within what is usual.</summary>
/// <param name="LoadQuantity">What the group watches.</param>
/// <param name="Size">Of a session of weight 1, in the unit of the load.</param>
/// <param name="Weeks">The ways to spread a week; each person keeps to one.</param>
/// <param name="BirthYears">First and last.</param>
/// <param name="IsPlanned">Whether a plan tells which sessions should bring a recording.</param>
public sealed record Habits(
    string Name, Sport Sport, string LoadQuantity, double Size, IReadOnlyList<IReadOnlyList<Slot>> Weeks, (int First, int Last) BirthYears, bool IsPlanned)
{
    private static readonly HappeningKind[] EveryEpisode = [HappeningKind.DoubleWeek, HappeningKind.DoubleSession, HappeningKind.NothingHeavy, HappeningKind.Fade];

    /// <summary>
    /// What has to be found. With two visits a week of which one in seven is missing, a week's load lies as far from the usual by chance as by doubling: in a clinic
    /// no rule of the week can tell.
    /// </summary>
    public IReadOnlyList<HappeningKind> Episodes { get; init; } = EveryEpisode;

    /// <summary>Five sessions, a match among them, with sprints in three.</summary>
    public static Habits Squad { get; } = new(
        "squad",
        new Sport("soccer"),
        QuantityNames.BanisterTrimp,
        80,
        [[
            new(IsoDayOfWeek.Monday, 0.9, 0, 1),
            new(IsoDayOfWeek.Tuesday, 1.2, 3, 8),
            new(IsoDayOfWeek.Thursday, 1.1, 3, 8),
            new(IsoDayOfWeek.Friday, 0.6, 0, 2),
            new(IsoDayOfWeek.Saturday, 1.4, 4, 12, PlanWord.Match),
        ]],
        (1996, 2007),
        IsPlanned: true);

    /// <summary>Four runs, one of them long and one of intervals; no plan.</summary>
    public static Habits Runners { get; } = new(
        "runners",
        new Sport("running"),
        QuantityNames.BanisterTrimp,
        60,
        [
            [
                new(IsoDayOfWeek.Tuesday, 1.1, 3, 8) { Metres = 9000 },
                new(IsoDayOfWeek.Wednesday, 0.8, 0, 1) { Metres = 8000 },
                new(IsoDayOfWeek.Friday, 1, 3, 6) { Metres = 9000 },
                new(IsoDayOfWeek.Sunday, 1.7, 0, 3) { Metres = 15000 },
            ],
            [
                new(IsoDayOfWeek.Monday, 0.8, 0, 1) { Metres = 8000 },
                new(IsoDayOfWeek.Wednesday, 1.1, 3, 8) { Metres = 9000 },
                new(IsoDayOfWeek.Thursday, 0.9, 0, 6) { Metres = 8500 },
                new(IsoDayOfWeek.Saturday, 1.7, 3, 5) { Metres = 15000 },
            ],
        ],
        (1970, 1998),
        IsPlanned: false);

    /// <summary>Machines on two or three days a week, in sets; no plan by person.</summary>
    public static Habits Clinic { get; } = new(
        "clinic",
        new Sport("training", "strength_training"),
        QuantityNames.Kilograms,
        2400,
        [
            [Visit(IsoDayOfWeek.Monday), Visit(IsoDayOfWeek.Thursday)],
            [Visit(IsoDayOfWeek.Tuesday), Visit(IsoDayOfWeek.Friday)],
            [Visit(IsoDayOfWeek.Monday), Visit(IsoDayOfWeek.Wednesday), Visit(IsoDayOfWeek.Friday)],
        ],
        (1938, 1962),
        IsPlanned: false)
    {
        Episodes = EveryEpisode[1..],
    };

    private static Slot Visit(IsoDayOfWeek day) => new(day, 1, 6, 14);
}

/// <summary>A session of the week.</summary>
/// <param name="Weight">Its size beside the others.</param>
/// <param name="HardLow">Fewest hard efforts of the legs, count.</param>
/// <param name="HardHigh">Most.</param>
public sealed record Slot(IsoDayOfWeek Day, double Weight, int HardLow, int HardHigh, PlanWord Word = PlanWord.TeamSession)
{
    public double? Metres { get; init; }
}
