using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Published;

/// <summary>The pool of motor units, rested and tired.</summary>
internal static class PoolChecks
{
    private static readonly MotorUnitPool Pool = MotorUnitPool.Usual;

    private static readonly Source Potvin2017 = new(
        "Potvin and Fuglevand 2017, A motor unit-based model of muscle fatigue, PLoS Comput Biol 13(6):e1005581", Reading.Quoted);

    private static readonly Source Elbow = new("measured in 10 people, as PMC2758423 prints it (authors not noted)", Reading.Read);

    private static readonly Source Staron2000 = new(
        "Staron et al. 2000, Fiber type composition of the vastus lateralis muscle of young men and women, J Histochem Cytochem 48:623-629", Reading.Computed);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("maximal force of the rested pool, in twitches of the smallest unit", Potvin2017, [2215.9811474699964], 1e-9, "", () => [Pool.MaximumForce]),
        new("contraction time of units 1, 20, 40, 60, 80, 100, 120, read off its figure 1B", Potvin2017, [90, 76, 63, 52, 43.5, 36, 30], 0.6, "ms", () =>
            [.. new[] { 1, 20, 40, 60, 80, 100, 120 }.Select(unit => Pool.ContractionSeconds[unit - 1] * 1000)]),
        new("20 % of the maximum is held for", Potvin2017, [511.5], 0.3, "s", () => [Endurance(0.2)]),
        new("50 % of the maximum is held for", Potvin2017, [95.5], 0.3, "s", () => [Endurance(0.5)]),
        new("80 % of the maximum is held for", Potvin2017, [14.8], 0.3, "s", () => [Endurance(0.8)]),
        new("fall of a maximal effort over its first 20 s, per second, read off its figure 7", Potvin2017, [1.4], 0.15, "%", () => [(1 - Maximal(20)) * 5]),
        new("left of a maximal effort after 70 s, read off its figure 7", Potvin2017, [50], 2, "%", () => [Maximal(70) * 100]),
        new("20 % of the maximum held by elbow flexors, 8.2 min, standard deviation 6.2", Elbow, [492], 372, "s", () => [Endurance(0.2)]),
        new("shares of the maximum at which the medium class, the largest and the last unit join (shares 43/34/23 %)", Staron2000, [0.321, 0.614, 0.7995], 5e-4, "", Thresholds),
    ];

    private static double Endurance(double fraction) => FatiguingPool.EnduranceSeconds(fraction, 3600, Pool) ?? double.NaN;

    private static double Maximal(int seconds)
    {
        var tired = new FatiguingPool(Pool);
        for (var step = 0; step < seconds * 10; step++)
        {
            tired.Hold(1);
        }

        return tired.Capacity;
    }

    private static double[] Thresholds()
    {
        var (slow, medium, _) = ClassShares.Usual.Split(Pool);
        return [Pool.ForceFractions[slow], Pool.ForceFractions[slow + medium], Pool.ForceFractions[^1]];
    }
}
