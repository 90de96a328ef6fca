using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Published;

/// <summary>The pool of motor units, rested and tired.</summary>
internal static class PoolChecks
{
    private static readonly Source Potvin2017 = new(
        "Potvin and Fuglevand 2017, A motor unit-based model of muscle fatigue, PLoS Comput Biol 13(6):e1005581", Reading.Quoted);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("maximal force of the rested pool, in twitches of the smallest unit", Potvin2017, [2215.9811474699964], 1e-9, "", () => [MotorUnitPool.Usual.MaximumForce]),
    ];
}
