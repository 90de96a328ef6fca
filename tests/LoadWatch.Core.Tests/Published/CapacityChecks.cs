using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Published;

/// <summary>Critical power and speed, W' and its recovery, time to exhaustion.</summary>
internal static class CapacityChecks
{
    private static readonly Source Skiba2012 = new(
        "Skiba et al. 2012, Modeling the expenditure and reconstitution of work capacity above critical power, Med Sci Sports Exerc 44:1526, as a public program's test prints it",
        Reading.Quoted);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("time constant of W' 25 W below critical power", Skiba2012, [741.2252275569871], 1e-9, "s", () => [WPrimeBalance.Tau(25)]),
    ];
}
