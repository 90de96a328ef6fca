namespace LoadWatch.Stimulus;

/// <summary>
/// One published form of how W', the work above critical power, comes back below it. Symbols: tau time constant, s; D critical power less the power of
/// the rest, W. How they compare with what was observed: table in <c>tests/README.md</c>.
/// </summary>
/// <param name="Name">Authors and year.</param>
/// <param name="FittedTo">The observations that its constants come from.</param>
/// <param name="Recovered">Share of what was spent that is back after a rest at one power.</param>
public sealed record WPrimeForm(string Name, string FittedTo, WPrimeForm.Share Recovered)
{
    /// <param name="wPrimeJoules">W', above 0.</param>
    /// <param name="belowWatts">D, 0 or more.</param>
    /// <param name="seconds">Length of the rest, 0 or more.</param>
    /// <returns>0 to 1.</returns>
    public delegate double Share(double wPrimeJoules, double belowWatts, double seconds);

    /// <summary>Skiba, Chidnok, Vanhatalo and Jones 2012, Modeling the expenditure and reconstitution of work capacity above critical power, Med Sci Sports
    /// Exerc 44:1526-1532. D is the mean of a session, and what was spent comes back also while more is spent.</summary>
    public static WPrimeForm Integral { get; } = new(
        "Skiba et al. 2012, integral", "times to exhaustion of Chidnok 2012", (_, below, seconds) => Exponential(IntegralTau(below), seconds));

    /// <summary>Skiba, Fulford, Clarke, Vanhatalo and Jones 2015, Intramuscular determinants of the ability to recover work capacity above critical power,
    /// Eur J Appl Physiol 115:703-713: tau = W' / D.</summary>
    public static WPrimeForm Differential { get; } = new(
        "Skiba et al. 2015, differential", "none: follows from its equation", (wPrime, below, seconds) => Exponential(wPrime / below, seconds));

    /// <summary>Bartram, Thewlis, Martin and Norton 2018, Accuracy of W' recovery kinetics in high performance cyclists, Int J Sports Physiol Perform
    /// 13:724-728.</summary>
    public static WPrimeForm Elite { get; } = new(
        "Bartram et al. 2018", "Bartram 2018", (_, below, seconds) => Exponential(EliteTau(below), seconds));

    /// <summary>Weigend, Clarke, Obst and Siegler 2022, A hydraulic model outperforms work-balance models for predicting recovery kinetics from intermittent
    /// exercise, arXiv:2108.04510: the differential form with a time constant fitted to recovery derived from Caen et al. 2019.</summary>
    public static WPrimeForm Fitted { get; } = new(
        "Weigend et al. on Caen 2019", "Caen 2019", (_, below, seconds) => Exponential(FittedTau(below), seconds));

    /// <summary>Chorley, Bott, Marwood and Lamb 2022, Bi-exponential modelling of W' reconstitution kinetics in trained cyclists, Eur J Appl Physiol
    /// 122:677-689: a fast and a slow phase, first recovery, whatever the power of the rest.</summary>
    public static WPrimeForm TwoPhase { get; } = new(
        "Chorley et al. 2022, two phases", "own trials, none of these", (_, _, seconds) => 1 - (0.5067 * Math.Exp(-seconds / 21.5)) - (0.4933 * Math.Exp(-seconds / 388)));

    public static IReadOnlyList<WPrimeForm> All { get; } = [Integral, Differential, Elite, Fitted, TwoPhase];

    /// <summary>Seconds, 316 to 862.</summary>
    public static double IntegralTau(double belowWatts) => (546 * Math.Exp(-0.01 * belowWatts)) + 316;

    /// <summary>Seconds; infinite at critical power itself, where nothing comes back.</summary>
    public static double EliteTau(double belowWatts) => 2287.2 * Math.Pow(belowWatts, -0.688);

    /// <summary>Seconds, 267 to 1541.</summary>
    public static double FittedTau(double belowWatts) => (1274.449 * Math.Exp(-0.0308077 * belowWatts)) + 266.648;

    private static double Exponential(double tau, double seconds) => 1 - Math.Exp(-seconds / tau);
}
