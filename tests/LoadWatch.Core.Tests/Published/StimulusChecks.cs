using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Published;

/// <summary>What endurance channels ask of motor units: recruitment in dynamic work, the cost of slopes.</summary>
internal static class StimulusChecks
{
    private static readonly Source Thomson1979 = new("Thomson, Green and Houston 1979 (authors from memory), Pflügers Arch 379:105 (abstract)", Reading.Read);

    private static readonly Source Vollestad1984 = new("Vøllestad, Vaage and Hermansen 1984, Acta Physiol Scand 122:433 (abstract)", Reading.Read);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("classes by use at 60 % of maximal oxygen uptake, most first", Thomson1979, ["slow", "medium", "largest"], () => ByUse(0.60)),
        new("at 75 % of maximal oxygen uptake, fresh: slow and medium as much as each other, and the largest", Vollestad1984, ["the same", "not yet"], () =>
        {
            var fractions = AtUptake(0.75);
            return [Math.Abs(fractions.Slow - fractions.Medium) < 0.01 ? "the same" : "not the same", fractions.Large > 0 ? "in" : "not yet"];
        }),
    ];

    /// <summary>Critical power at 80 % of maximal oxygen uptake and a maximum of 3.3 times it: an assumption.</summary>
    private static ClassFractions AtUptake(double share) => Variant.Mid.Recruitment.At(Drive.Of(share, 0.8, 0.8 * 3.3, 1, Variant.Mid.CriticalDrive));

    private static string[] ByUse(double share)
    {
        var fractions = AtUptake(share);
        return [.. new[] { ("largest", fractions.Large), ("medium", fractions.Medium), ("slow", fractions.Slow) }.OrderByDescending(one => one.Item2).Select(one => one.Item1)];
    }
}
