// Cut-offs: Cruz-Jentoft et al. 2019, Age Ageing 48:16-31 (EWGSOP2). Grip below 27 kg (men), 16 kg (women); five chair stands in more than 15 s; gait speed
// of 0.8 m/s or less; timed up and go of 20 s or more; short physical performance battery of 8 points or fewer; 400 m walk in 360 s or more or not completed.
// The chair stand, the battery and the walk are from memory. Chair stands in 30 s have no cut-off there: that they were not
// done, or are overdue, is told. The numbers stand in FunctionTestLimits, the operators here.
using LoadWatch.Loads;
using LoadWatch.People;

namespace LoadWatch.Findings;

/// <summary>A function test: its word, how to name it, its unit, the published cut-off and the error of the test.</summary>
/// <param name="Word">As tables write it.</param>
/// <param name="Name">As sentences write it.</param>
/// <param name="MoreIsBetter">False for times.</param>
/// <param name="Limit">The cut-off in the unit; null without one for this person.</param>
/// <param name="IsBeyond">Whether a value lies beyond a cut-off, by the operator of its source.</param>
/// <param name="Words">The operator in words, before the cut-off.</param>
/// <param name="Error">A change of more than this is more than the error of the test, in the unit; null where none is known: no fall is told.</param>
public sealed record FunctionTest(
    string Word,
    string Name,
    string Unit,
    bool MoreIsBetter,
    Func<FunctionTestLimits, Sex?, double?> Limit,
    Func<double, double, bool> IsBeyond,
    string Words,
    Func<FunctionTestLimits, double?> Error)
{
    /// <summary>How much worse a value is than an earlier one, in the unit; negative where it is better.</summary>
    public double Fall(double earlier, double value) => Significant.Round(MoreIsBetter ? earlier - value : value - earlier);

    /// <summary>A value that is better by so much.</summary>
    public double Better(double value, double by) => Significant.Round(MoreIsBetter ? value + by : value - by);
}

/// <summary>The function tests that LoadWatch knows.</summary>
public static class FunctionTests
{
    public const string Grip = "grip_strength";
    public const string ChairStands = SitToStandPower.FiveRises;
    public const string ChairStandsIn30Seconds = SitToStandPower.RisesInThirtySeconds;
    public const string Gait = "gait_speed";
    public const string UpAndGo = "timed_up_and_go";
    public const string PerformanceBattery = "short_physical_performance_battery";
    public const string Walk400 = "walk_400_m";

    public static IReadOnlyList<FunctionTest> All { get; } =
    [
        new(Grip, "Grip strength", "kg", true, GripLimit, (value, limit) => value < limit, "below", limits => limits.GripKilograms),
        new(ChairStands, "Five chair stands", "s", false, (limits, _) => limits.ChairStandCutOffSeconds, (value, limit) => value > limit, "above", limits => limits.ChairStandSeconds),
        new(ChairStandsIn30Seconds, "Chair stands in 30 s", "count", true, (_, _) => null, (_, _) => false, "below", _ => null),
        new(Gait, "Gait speed", "m/s", true, (limits, _) => limits.GaitCutOffMetresPerSecond, (value, limit) => value <= limit, "at or below", limits => limits.GaitMetresPerSecond),
        new(UpAndGo, "Timed up and go", "s", false, (limits, _) => limits.UpAndGoCutOffSeconds, (value, limit) => value >= limit, "at or above", limits => limits.UpAndGoSeconds),
        new(
            PerformanceBattery,
            "Short physical performance battery",
            "points",
            true,
            (limits, _) => limits.PerformanceBatteryCutOffPoints,
            (value, limit) => value <= limit,
            "at or below",
            limits => limits.PerformanceBatteryPoints),
        new(Walk400, "400 m walk", "s", false, (limits, _) => limits.Walk400CutOffSeconds, (value, limit) => value >= limit, "at or above", _ => null),
    ];

    public static FunctionTest? Of(string word) => All.FirstOrDefault(test => test.Word == word);

    /// <summary>By sex, as the source gives it; not stated: no cut-off.</summary>
    private static double? GripLimit(FunctionTestLimits limits, Sex? sex) => sex switch
    {
        Sex.Male => limits.GripCutOffMenKilograms,
        Sex.Female => limits.GripCutOffWomenKilograms,
        _ => null,
    };
}
