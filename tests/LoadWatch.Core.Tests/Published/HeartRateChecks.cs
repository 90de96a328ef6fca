using LoadWatch.Loads;
using LoadWatch.People;

namespace LoadWatch.Tests.Published;

/// <summary>Maximal heart rate by age, classes of intensity, heart-rate reserve.</summary>
internal static class HeartRateChecks
{
    private static readonly Source Tanaka2001 = new(
        "Tanaka, Monahan and Seals 2001, Age-predicted maximal heart rate revisited, J Am Coll Cardiol 37:153-156", Reading.Read);

    private static readonly Source Nes2013 = new(
        "Nes et al. 2013, Age-predicted maximal heart rate in healthy subjects: The HUNT Fitness Study, Scand J Med Sci Sports 23:697-704 (abstract)", Reading.Read);

    private static readonly Source Gulati2010 = new(
        "Gulati et al. 2010, Heart rate response to exercise stress testing in asymptomatic women: The St. James Women Take Heart Project, Circulation 122:130-137 (abstract)", Reading.Read);

    private static readonly Source Sydo2014 = new("Sydó et al. 2014, Relationship between exercise heart rate and age in men vs women, Mayo Clin Proc (abstract)", Reading.Read);

    private static readonly Source Gellish2007 = new(
        "Gellish et al. 2007, Longitudinal modeling of the relationship between age and maximal heart rate, Med Sci Sports Exerc 39:822-829", Reading.FromMemory);

    private static readonly Source Garber2011 = new(
        "Garber et al. 2011, Quantity and quality of exercise for developing and maintaining cardiorespiratory, musculoskeletal, and neuromotor fitness in apparently healthy adults, Med Sci Sports Exerc 43:1334-1359", Reading.Read);

    private static readonly Source Acsm = new("American College of Sports Medicine, Guidelines for exercise testing and prescription, example of a target heart rate", Reading.FromMemory);

    private static readonly string[] Classes = ["very light", "light", "moderate", "vigorous", "near-maximal"];

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("maximal heart rate: intercept, and fall a year", Tanaka2001, [208, 0.7], 1e-6, "bpm", () => Line(HeartRateMaxEquation.Tanaka, null)),
        new("maximal heart rate, healthy people: the same", Nes2013, [211, 0.64], 1e-6, "bpm", () => Line(HeartRateMaxEquation.Nes, null)),
        new("maximal heart rate, women: the same", Gulati2010, [206, 0.88], 1e-6, "bpm", () => Line(HeartRateMaxEquation.Gulati, Sex.Female)),
        new("maximal heart rate, men of 40 to 89 years: the same", Sydo2014, [220, 0.95], 1e-6, "bpm", () => Line(HeartRateMaxEquation.Sydo, Sex.Male)),
        new("maximal heart rate, women of 40 to 89 years: the same", Sydo2014, [210, 0.79], 1e-6, "bpm", () => Line(HeartRateMaxEquation.Sydo, Sex.Female)),
        new("maximal heart rate, 30 to 75 years: the same", Gellish2007, [207, 0.7], 1e-6, "bpm", () => Line(HeartRateMaxEquation.Gellish, null)),
        new(
            "class at 29, 30, 39, 40, 59, 60, 89, 90 % of heart-rate reserve",
            Garber2011,
            ["very light", "light", "light", "moderate", "moderate", "vigorous", "vigorous", "near-maximal"],
            () => [.. new[] { 29, 30, 39, 40, 59, 60, 89, 90 }.Select(Class)]),
        new("heart rate at 60 and 70 % of the reserve, rest 70, maximum 180", Acsm, [136, 147], 1e-6, "bpm", () =>
            [new HeartRateReserve(70, 180, Estimated: false).BpmAt(0.6), new HeartRateReserve(70, 180, Estimated: false).BpmAt(0.7)]),
    ];

    private static double[] Line(HeartRateMaxEquation equation, Sex? sex) =>
        [equation.BpmAt(0, sex)!.Value, equation.BpmAt(50, sex)!.Value - equation.BpmAt(51, sex)!.Value];

    /// <summary>Rest 50, maximum 150: one beat is one percent.</summary>
    private static string Class(int percent)
    {
        var anchors = Given.Anchors(Given.Anchor(AnchorKind.HeartRateRest, 50), Given.Anchor(AnchorKind.HeartRateMax, 150));
        var time = ZoneTimes.OfHeartRate(Given.Histogram((50 + percent, 1)), Given.Date, Given.Person(), anchors, new Activities.ComputationSettings().HeartRateReserveBounds)!;
        return Classes[time.Seconds.ToList().FindIndex(seconds => seconds > 0)];
    }
}
