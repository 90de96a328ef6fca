using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.Recordings;

namespace LoadWatch.Tests.Published;

/// <summary>Oxygen uptake by speed, gradient and power; effort by step cadence.</summary>
internal static class EffortChecks
{
    private const double MetresPerSecondPerMile = 26.8 / 60;
    private const double WattsPerKilogramMetre = 9.80665 / 60;

    private static readonly Source Bushman2020 = new(
        "Bushman 2020, Metabolic calculations in action: part 2, ACSM's Health Fit J 24(4):5-8, box 1 (American College of Sports Medicine, Guidelines, table 6.3)",
        Reading.Read);

    private static readonly Source Slides = new("lecture slides on the equations of the American College of Sports Medicine, worked examples", Reading.Quoted);

    private static readonly Source Treadmill = new("Armstrong, Metabolic equations: treadmill energy expenditure (course page), worked example", Reading.Quoted);

    private static readonly Source Key = new("Southern Illinois University Edwardsville, ACSM practice problems, answer key, problem 1", Reading.Quoted);

    private static readonly Source InClass = new("exercise sheet of metabolic calculations with answers, problems 1 and 2", Reading.Quoted);

    private static readonly Source Young = new(
        "Tudor-Locke et al. 2019, Walking cadence (steps/min) and intensity in 21-40 year olds: CADENCE-adults, Int J Behav Nutr Phys Act 16:8 (abstract)", Reading.Read);

    private static readonly Source MiddleAged = new(
        "Tudor-Locke et al. 2020, Walking cadence (steps/min) and intensity in 41 to 60-year-old adults: the CADENCE-adults study, Int J Behav Nutr Phys Act 17 (abstract)",
        Reading.Read);

    private static readonly Source Old = new(
        "Tudor-Locke et al. 2021, Walking cadence (steps/min) and intensity in 61-85-year-old adults: the CADENCE-Adults study, Int J Behav Nutr Phys Act 18:129 (abstract)",
        Reading.Read);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("oxygen uptake of walking: at rest, each m/min along, each m/min up", Bushman2020, [3.5, 0.1, 1.8], 1e-9, "mL/kg/min", () => Terms(OxygenCost.Walking)),
        new("oxygen uptake of running: the same", Bushman2020, [3.5, 0.2, 0.9], 1e-9, "mL/kg/min", () => Terms(OxygenCost.Running)),
        new("oxygen uptake of leg cycling: unloaded, each kg m/min and kg", Bushman2020, [7, 1.8], 1e-9, "mL/kg/min", () =>
            [OxygenCost.LegCycling(0, 1), OxygenCost.LegCycling(WattsPerKilogramMetre, 1) - OxygenCost.LegCycling(0, 1)]),
        new("oxygen uptake of walking at 3.5 mph and 10 %", Slides, [29.76], 0.01, "mL/kg/min", () => [OxygenCost.Walking(3.5 * MetresPerSecondPerMile, 0.1)]),
        new("oxygen uptake of walking at 2.5 mph and 3 %", Treadmill, [13.8], 0.05, "mL/kg/min", () => [OxygenCost.Walking(2.5 * MetresPerSecondPerMile, 0.03)]),
        new("METs of walking at 75 m/min and 10 %", Key, [7], 1e-6, "MET", () => [OxygenCost.Walking(75 / 60.0, 0.1) / OxygenCost.Rest]),
        new("oxygen uptake of running at 8 mph", InClass, [46.38], 0.01, "mL/kg/min", () => [OxygenCost.Running(8 * MetresPerSecondPerMile, 0)]),
        new("oxygen uptake of leg cycling at 840 kg m/min, 86.36 kg", InClass, [24.51], 0.01, "mL/kg/min", () =>
            [OxygenCost.LegCycling(840 * WattsPerKilogramMetre, 86.36)]),
        new("oxygen uptake of leg cycling at 450 kg m/min, 62 kg", Slides, [20], 0.1, "mL/kg/min", () => [OxygenCost.LegCycling(450 * WattsPerKilogramMetre, 62)]),
        new("step cadence at 3 and 6 METs by regression, 21 and 40 years", Young, [102, 129, 102, 129], 1e-9, "steps/min", () => ByAge(21, 40)),
        new("step cadence at 3 and 6 METs by regression, 41 and 60 years", MiddleAged, [101.7, 132.1, 101.7, 132.1], 1e-9, "steps/min", () => ByAge(41, 60)),
        new("step cadence at 3 and 6 METs by regression, 61 and 85 years", Old, [103.1, 142.9, 103.1, 142.9], 1e-9, "steps/min", () => ByAge(61, 85)),
        new("effort at 99, 100, 129, 130 steps/min, 30 years", Young, ["light", "moderate", "moderate", "vigorous"], () => Efforts(30)),
        new("effort at 99, 100, 129, 130 steps/min, 50 years", MiddleAged, ["light", "moderate", "moderate", "vigorous"], () => Efforts(50)),
        new("effort at 99, 100, 129, 130 steps/min, 70 years", Old, ["light", "moderate", "moderate", "vigorous"], () => Efforts(70)),
    ];

    private static double[] Terms(Func<double, double, double> uptake) =>
        [uptake(0, 0), uptake(1 / 60.0, 0) - uptake(0, 0), uptake(1 / 60.0, 1) - uptake(1 / 60.0, 0)];

    private static double[] ByAge(params int[] ages) =>
        [.. ages.Select(age => StepCadence.Lines(StepCadenceLine.ByAge, age)).SelectMany(lines => new[] { lines.Moderate, lines.Vigorous })];

    private static string[] Efforts(int age) => [.. new[] { 99, 100, 129, 130 }.Select(steps => Effort(steps, age))];

    /// <summary>Of a minute of walking.</summary>
    private static string Effort(int steps, int age)
    {
        var walk = Given.Recording("walking", Given.EverySecond((Channel.Cadence, Given.Steps((steps / 2.0, 60)))));
        var values = ActivityComputation.Compute(walk, Given.Person(birthYear: Given.Date.Year - age), Given.Anchors(), new ComputationSettings());
        return values.Quantities.Count(quantity => quantity is { Name: QuantityNames.MinutesModerate or QuantityNames.MinutesVigorous, Value: 1 }) switch
        {
            0 => "light",
            1 => "moderate",
            _ => "vigorous",
        };
    }
}
