using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Published;

/// <summary>The pool of motor units, rested and tired.</summary>
internal static class PoolChecks
{
    private static readonly MotorUnitPool Pool = MotorUnitPool.Usual;

    private static readonly Source Potvin2017 = new(
        "Potvin and Fuglevand 2017, A motor unit-based model of muscle fatigue, PLoS Comput Biol 13(6):e1005581", Reading.Quoted);

    private static readonly Source FreyLaw2010 = new(
        "Frey Law and Avin 2010, Ergonomics 53:109-129, general curve of 194 publications, 21.92 f^-1.98 s, as two pages print its table 2", Reading.Quoted);

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
        new("20, 30, 40, 50, 60 % of the maximum are held for (29 % is the narrower bound of the source's 95 % band)", FreyLaw2010, [530.6, 237.8, 134.5, 86.5, 60.3], Tolerance.Share(0.29), "s", () =>
            [.. new[] { 0.2, 0.3, 0.4, 0.5, 0.6 }.Select(Endurance)]),
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
}
