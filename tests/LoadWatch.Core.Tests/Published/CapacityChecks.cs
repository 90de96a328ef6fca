using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Published;

/// <summary>Critical power and speed, W' and its recovery, time to exhaustion.</summary>
internal static class CapacityChecks
{
    private static readonly Source Skiba2012 = new(
        "Skiba et al. 2012, Modeling the expenditure and reconstitution of work capacity above critical power, Med Sci Sports Exerc 44:1526, as a public program's test prints it",
        Reading.Quoted);

    private static readonly Source Minetti2002 = new(
        "Minetti et al. 2002, Energy cost of walking and running at extreme uphill and downhill slopes, J Appl Physiol 93:1039-1046", Reading.Quoted);

    private static readonly double[] DownAndLevel = [-0.45, -0.40, -0.35, -0.30, -0.20, -0.10, 0];
    private static readonly double[] Up = [0.10, 0.20, 0.30, 0.35, 0.40, 0.45];
    private static readonly double[] SteepWalks = [-0.45, -0.40, -0.35, -0.30, 0.10, 0.20, 0.30, 0.35, 0.40, 0.45];

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("time constant of W' 25 W below critical power", Skiba2012, [741.2252275569871], 1e-9, "s", () => [WPrimeForm.IntegralTau(25)]),
        new(
            "measured cost of running at gradients of -0.45 to 0",
            Minetti2002,
            [3.92, 3.49, 2.81, 2.43, 1.73, 1.93, 3.40],
            Tolerance.Share(0.12),
            "J/kg/m",
            () => [.. DownAndLevel.Select(SlopeCost.Running)]),
        new("measured cost of running at gradients of 0.10 to 0.45", Minetti2002, [5.77, 8.92, 12.52, 14.43, 16.83, 18.93], Tolerance.Share(0.04), "J/kg/m", () => [.. Up.Select(SlopeCost.Running)]),
        new(
            "measured cost of walking at ten steep gradients, -0.45 to 0.45",
            Minetti2002,
            [3.46, 3.23, 2.65, 2.18, 4.68, 8.07, 11.29, 12.72, 14.75, 17.33],
            Tolerance.Share(0.12),
            "J/kg/m",
            () => [.. SteepWalks.Select(SlopeCost.Walking)]),
    ];
}
