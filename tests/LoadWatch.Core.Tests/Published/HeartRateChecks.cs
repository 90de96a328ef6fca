using LoadWatch.Loads;

namespace LoadWatch.Tests.Published;

/// <summary>Maximal heart rate by age, classes of intensity.</summary>
internal static class HeartRateChecks
{
    private static readonly Source Tanaka2001 = new(
        "Tanaka, Monahan and Seals 2001, Age-predicted maximal heart rate revisited, J Am Coll Cardiol 37:153-156", Reading.Read);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("maximal heart rate at 20, 60 and 80 years", Tanaka2001, [194, 166, 152], 1e-9, "bpm", () => [.. new[] { 20, 60, 80 }.Select(age => TanakaHeartRateMax.Of(age)!.Value)]),
    ];
}
