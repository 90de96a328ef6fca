using NodaTime;
using static NodaTime.IsoDayOfWeek;

namespace LoadWatch.Service.Demo;

/// <summary>What a session of the demo is made of.</summary>
public enum SessionKind
{
    Row,
    RowIntervals,
    RowLong,
    Gym,
    ClassAll,
    ClassArms,
    Ride,
    RideIntervals,
}

/// <summary>One session of a usual week.</summary>
/// <param name="At">Local start.</param>
/// <param name="Minutes">Usual length; intervals are as long as their efforts, the long row is as long as it says.</param>
public sealed record WeekSlot(IsoDayOfWeek Day, LocalTime At, SessionKind Kind, int Minutes);

/// <summary>A usual week. Rest days stand alone, or in pairs where three days are trained, so no week looks heavier because its rest is not known yet.</summary>
/// <param name="LengthDeviation">Standard deviation of a session's length around its usual one, as a fraction.</param>
public sealed record WeekPlan(double LengthDeviation, IReadOnlyList<WeekSlot> Slots)
{
    private static readonly LocalTime Morning = new(6, 40);
    private static readonly LocalTime Forenoon = new(10, 0);
    private static readonly LocalTime Afternoon = new(16, 30);

    public static WeekPlan FiveRows { get; } = new(0.12,
    [
        new(Monday, Morning, SessionKind.Row, 40),
        new(Tuesday, Morning, SessionKind.RowIntervals, 30),
        new(Wednesday, Morning, SessionKind.Row, 32),
        new(Wednesday, Afternoon, SessionKind.Gym, 40),
        new(Thursday, Morning, SessionKind.Row, 42),
        new(Saturday, Forenoon, SessionKind.Row, 50),
    ]);

    public static WeekPlan FourRowsTwoGyms { get; } = new(0.12,
    [
        new(Monday, Afternoon, SessionKind.Gym, 40),
        new(Tuesday, Morning, SessionKind.RowIntervals, 30),
        new(Wednesday, Morning, SessionKind.Row, 40),
        new(Thursday, Morning, SessionKind.Row, 38),
        new(Friday, Afternoon, SessionKind.Gym, 40),
        new(Saturday, Forenoon, SessionKind.Row, 52),
    ]);

    public static WeekPlan ThreeDays { get; } = new(0.06,
    [
        new(Monday, Morning, SessionKind.Row, 45),
        new(Monday, Afternoon, SessionKind.Gym, 40),
        new(Wednesday, Morning, SessionKind.RowIntervals, 30),
        new(Saturday, Forenoon, SessionKind.Row, 45),
    ]);

    public static WeekPlan ThreeClasses { get; } = new(0.05,
    [
        new(Tuesday, Forenoon, SessionKind.ClassAll, 45),
        new(Thursday, Forenoon, SessionKind.ClassAll, 45),
        new(Saturday, Forenoon, SessionKind.ClassAll, 45),
    ]);

    public static WeekPlan TwoClasses { get; } = new(0.05,
    [
        new(Tuesday, Forenoon, SessionKind.ClassAll, 50),
        new(Thursday, Forenoon, SessionKind.ClassAll, 50),
    ]);

    public static WeekPlan ThreeRides { get; } = new(0.08,
    [
        new(Tuesday, Afternoon, SessionKind.RideIntervals, 40),
        new(Thursday, Afternoon, SessionKind.Ride, 45),
        new(Sunday, Forenoon, SessionKind.Ride, 60),
    ]);

    /// <summary>The sessions of a week of two rows a day, every day as hard as the next.</summary>
    public static IReadOnlyList<WeekSlot> TwoRowsADay { get; } =
        [.. Enum.GetValues<IsoDayOfWeek>().Where(day => day != None).SelectMany(RowsOf)];

    /// <summary>More than twice as long as any row of a usual week.</summary>
    public static WeekSlot RowAcrossTheLake(IsoDayOfWeek day) => new(day, Forenoon, SessionKind.RowLong, 135);

    public IEnumerable<WeekSlot> On(IsoDayOfWeek day) => Slots.Where(slot => slot.Day == day);

    private static IEnumerable<WeekSlot> RowsOf(IsoDayOfWeek day)
    {
        yield return new(day, Morning, day == Tuesday ? SessionKind.RowIntervals : SessionKind.Row, 47);
        yield return new(day, Afternoon, SessionKind.Row, day == Tuesday ? 60 : 42);
    }
}
