using LoadWatch.Findings;
using LoadWatch.People;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>
/// What each test and reference value is measured in, and which values are plausible. Ranges of the function tests: a choice, far beyond any
/// measured person.
/// </summary>
internal static class TestMeasures
{
    private static readonly NumberRole[] Performed =
    [
        new(FunctionTests.Grip, Measure.Kilograms, 0, 150),
        new(FunctionTests.ChairStands, Measure.Seconds, 1, 600),
        new("chair_stands_30_s", Measure.Only("count"), 0, 100) { IsWhole = true },
        new(FunctionTests.Gait, Measure.MetresPerSecond, 0, 5),
        new(FunctionTests.UpAndGo, Measure.Seconds, 1, 600),
        new(FunctionTests.PerformanceBattery, Measure.Only("points"), 0, 12) { IsWhole = true },
        new(FunctionTests.Walk400, Measure.Seconds, 60, 3600),
        new("appendicular_muscle_mass", Measure.Kilograms, 1, 100),
    ];

    private static readonly Dictionary<string, NumberRole> Table =
        Performed.Concat(AnchorKinds.All.Select(FromAnchor)).ToDictionary(test => test.Name, StringComparer.Ordinal);

    /// <summary>Function tests, then anchors.</summary>
    public static IReadOnlyList<string> Words { get; } = [.. Performed.Concat(AnchorKinds.All.Select(FromAnchor)).Select(test => test.Name)];

    public static NumberRole Of(string test) => Table[test];

    public static bool Knows(string unit) => Table.Values.Any(test => test.Measure!.Find(unit) is not null);

    private static NumberRole FromAnchor(AnchorKindInfo anchor) => new(anchor.Name, OfUnit(anchor.Kind, anchor.Unit), anchor.Lowest, anchor.Highest);

    private static Measure OfUnit(AnchorKind kind, string unit) => (kind, unit) switch
    {
        (AnchorKind.Height, _) => Measure.BodyMetres,
        (_, "kg") => Measure.Kilograms,
        (_, "m/s") => Measure.MetresPerSecond,
        _ => Measure.Only(unit),
    };
}
