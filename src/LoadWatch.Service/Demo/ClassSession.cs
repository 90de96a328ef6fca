using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>A line of the gym's set log; null where the gym writes nothing.</summary>
internal sealed record LoggedSet(
    LocalDate Date, LocalTime Time, string Exercise, string? Machine, int Set, int? Repetitions, double? Kilograms, double Hardness, int? Seconds, string Load)
{
    public bool IsHold => Seconds is not null;
}

/// <summary>The sets of a class: machines for legs and arms, and at its end a hold, a band and a push against the wall.</summary>
internal static class ClassSession
{
    private const int Repetitions = 8;

    private static readonly Exercise[] Legs =
        [new("leg_press", "press 1", 3), new("leg_curl", "curl 1", 2), new("leg_extension", "extension 1", 2), new("calf_raise", "calf 1", 2)];

    private static readonly Exercise[] Arms = [new("chest_press", "chest 1", 3), new("seated_row", "row 1", 3), new("shoulder_press", "shoulder 1", 2)];

    /// <summary>Share of the maximum that 8 repetitions leave at a hardness: repetitions to failure by a common load chart (8 + 10 - hardness).</summary>
    private static readonly (double Hardness, double OfMaximum)[] Efforts = [(7, 0.725), (7.5, 0.738), (8, 0.75)];

    public static IReadOnlyList<LoggedSet> Sets(DemoPerson person, PlannedSession planned, DemoRandom random)
    {
        List<LoggedSet> sets = [];
        var minutes = 0.0;
        foreach (var (exercise, round) in Exercises(planned.Slot.Kind))
        {
            var (hardness, share) = Efforts[random.Whole(0, Efforts.Length - 1)];
            var kilograms = Plates(person.OneRepetitionMaxKilograms(exercise.Name) * share * random.Factor(0.01));
            var done = SetsOf(exercise, random);
            for (var set = 1; set <= done; set++, minutes += random.Between(1.7, 2.6))
                sets.Add(new(planned.Date, At(planned, minutes), exercise.Name, exercise.Machine, (round * exercise.Sets) + set, Repetitions, kilograms, hardness, null, "weight"));
        }

        sets.Add(new(planned.Date, At(planned, minutes), "pulldown", null, 1, Repetitions, null, random.Whole(7, 8), null, "band"));
        sets.Add(new(planned.Date, At(planned, minutes + 2), "wall_push_up", null, 1, Repetitions, null, random.Whole(7, 8), null, "body_weight"));
        sets.Add(new(planned.Date, At(planned, minutes + 4), "plank", null, 1, null, null, random.Whole(5, 7), random.Whole(4, 8) * 5, "body_weight"));
        return sets;
    }

    /// <summary>Sometimes time runs out; the press comes first and is done in full.</summary>
    private static int SetsOf(Exercise exercise, DemoRandom random) =>
        exercise == Legs[0] || random.Between(0, 1) < 0.75 ? exercise.Sets : exercise.Sets - 1;

    private static IEnumerable<(Exercise Exercise, int Round)> Exercises(SessionKind kind) => kind == SessionKind.ClassArms
        ? Arms.Select(exercise => (exercise, 0)).Concat(Arms.Select(exercise => (exercise, 1)))
        : Legs.Concat(Arms).Select(exercise => (exercise, 0));

    private static LocalTime At(PlannedSession planned, double minutes) => planned.Slot.At.PlusMinutes((long)minutes);

    private static double Plates(double kilograms)
    {
        var step = kilograms > 40 ? 2.5 : 0.5;
        return Math.Round(kilograms / step) * step;
    }

    private sealed record Exercise(string Name, string Machine, int Sets);
}
