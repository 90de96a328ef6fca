using LoadWatch.Capacity;
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

    private static readonly Source Weigend2022 = new(
        "Weigend, Gray, Obst and Siegler 2022, arXiv:2207.14295, with the data files published beside it", Reading.Read);

    /// <summary>Critical power, W', their standard errors, R2; half of the last printed digit, and what a number in binary may lie beside it.</summary>
    private static readonly Tolerance OfLines = Tolerance.Each(0.000501, 0.0501, 0.00501, 0.0501, 0.00000501);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        OfWork(1, 217.198, 11910.4, 4.63, 1261.7, 0.99864),
        OfWork(2, 290.566, 19417.4, 6.15, 1896.1, 0.99866),
        OfWork(3, 236.254, 11383.9, 1.15, 503.1, 0.99995),
        OfWork(4, 201.492, 15727.8, 2.65, 1199.0, 0.99948),
        OfWork(5, 173.629, 14510.5, 3.00, 773.8, 0.99910),
        OfPower(1, 210.961, 13239.8, 6.52, 1156.0, 0.97764),
        OfPower(2, 291.716, 19143.1, 7.03, 1526.7, 0.98128),
        OfPower(3, 237.962, 10819.7, 1.57, 393.3, 0.99736),
        OfPower(4, 198.563, 16790.1, 3.57, 1054.5, 0.98830),
        OfPower(5, 173.816, 14468.9, 2.68, 553.9, 0.99562),
        OfTime(1, 221.007, 10479.7),
        OfTime(2, 291.033, 19098.2),
        OfTime(3, 235.153, 11963.9),
        OfTime(4, 204.066, 14268.9),
        OfTime(5, 173.295, 14582.2),
        new(
            "critical power, W', asymptote of the three-parameter fit, third person (W, J, s)",
            Weigend2022,
            [232.266, 14841.6, -44.004],
            Tolerance.Each(0.000501, 0.0501, 0.000501),
            "",
            () => ThreeParameterFit.Of(PublishedTrials.Of(3)) is { } fit ? [fit.Fit.Critical, fit.Fit.Reserve, fit.AsymptoteSeconds] : []),
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

    private static PublishedCheck OfWork(int person, params double[] published) =>
        new($"critical power, W', their errors and R2 of work on time, person {person} of 5 (W, J)", Weigend2022, published, OfLines, "", () => Line(WorkTimeFit.Of(PublishedTrials.Of(person))));

    private static PublishedCheck OfPower(int person, params double[] published) =>
        new($"critical power, W', their errors and R2 of power on inverse time, person {person} of 5 (W, J)", Weigend2022, published, OfLines, "", () => Line(InverseTimeFit.Of(PublishedTrials.Of(person))));

    private static PublishedCheck OfTime(int person, params double[] published) => new(
        $"critical power and W' of least squares in time, person {person} of 5 (W, J)",
        Weigend2022,
        published,
        Tolerance.Each(0.000501, 0.0501),
        "",
        () => TimeFit.Of(PublishedTrials.Of(person)) is { } fit ? [fit.Critical, fit.Reserve] : []);

    private static double[] Line(CapacityFit? fit) =>
        fit is { CriticalError: { } critical, ReserveError: { } reserve, RSquared: { } rSquared } ? [fit.Critical, fit.Reserve, critical, reserve, rSquared] : [];
}
