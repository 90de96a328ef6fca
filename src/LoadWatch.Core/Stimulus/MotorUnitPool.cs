namespace LoadWatch.Stimulus;

/// <summary>
/// The rested pool of motor units that joins from small to large. Source: Potvin and Fuglevand 2017, A motor unit-based model of muscle
/// fatigue,
/// PLoS Comput Biol 13(6):e1005581, equations 1 to 7.
/// n = 120 units; threshold RTE(i) = RR^((i-1)/(n-1)), in units of excitation; twitch force P(i) = RP^((i-1)/(n-1)), RP = 100, in units of
/// P(1);
/// contraction time CT(i) = 90 ms P(i)^(-ln 3 / ln 100); rate R(i) = min(peak, 8 + (E - RTE(i))) impulses per second from the threshold on.
/// Departure: the peak rate falls from 35 to 25 with the threshold, 35 - 10 (RTE(i) - 1)/(RR - 1), not with rank: that form gives the
/// published endurance times.
/// </summary>
public sealed class MotorUnitPool
{
    public const int Units = 120;

    private const double TwitchRange = 100;
    private const double ContractionRange = 3;
    private const double SlowestContractionSeconds = 0.090;
    private const double LowestRate = 8;
    private const double HighestPeakRate = 35;
    private const double PeakRateFall = 10;

    private readonly double[] thresholds = new double[Units];
    private readonly double[] twitches = new double[Units];
    private readonly double[] contractionSeconds = new double[Units];
    private readonly double[] peakRates = new double[Units];
    private readonly double[] forceFractions = new double[Units];
    private readonly Lazy<InverseTable> inverse;

    private MotorUnitPool(double thresholdRange)
    {
        for (var unit = 0; unit < Units; unit++)
        {
            var rank = unit / (Units - 1.0);
            thresholds[unit] = Math.Pow(thresholdRange, rank);
            twitches[unit] = Math.Pow(TwitchRange, rank);
            contractionSeconds[unit] = SlowestContractionSeconds * Math.Pow(ContractionRange, -rank);
            peakRates[unit] = HighestPeakRate - (PeakRateFall * (thresholds[unit] - 1) / (thresholdRange - 1));
        }

        HighestExcitation = thresholds[^1] + peakRates[^1] - LowestRate;
        MaximumForce = ForceAt(HighestExcitation);
        forceFractions = [.. thresholds.Select(threshold => ForceAt(threshold) / MaximumForce)];
        inverse = new Lazy<InverseTable>(() => new InverseTable(this));
    }

    /// <summary>RR = 30: the last unit joins at 62 % of the maximal force.</summary>
    public static MotorUnitPool Narrow { get; } = new(30);

    /// <summary>RR = 50, the source's own.</summary>
    public static MotorUnitPool Usual { get; } = new(50);

    /// <summary>RR = 70.</summary>
    public static MotorUnitPool Broad { get; } = new(70);

    /// <summary>Excitation at which every unit fires at its peak rate.</summary>
    public double HighestExcitation { get; }

    /// <summary>Force at <see cref="HighestExcitation"/>, in units of P(1).</summary>
    public double MaximumForce { get; }

    /// <summary>RTE of each unit, smallest first, in units of excitation.</summary>
    public IReadOnlyList<double> Thresholds => thresholds;

    /// <summary>P of each unit, in units of P(1).</summary>
    public IReadOnlyList<double> Twitches => twitches;

    /// <summary>CT of each unit, seconds.</summary>
    public IReadOnlyList<double> ContractionSeconds => contractionSeconds;

    /// <summary>Peak rate of each unit, impulses per second.</summary>
    public IReadOnlyList<double> PeakRates => peakRates;

    /// <summary>Share of the maximal force, 0 to 1, at which each unit joins: ascending.</summary>
    public IReadOnlyList<double> ForceFractions => forceFractions;

    /// <summary>Number of units that fire at an excitation.</summary>
    public int RecruitedAt(double excitation) => thresholds.Count(threshold => threshold <= excitation);

    /// <summary>Force at an excitation, in units of P(1); beyond the highest excitation nothing is added.</summary>
    public double ForceAt(double excitation)
    {
        var force = 0.0;
        for (var unit = 0; unit < Units && thresholds[unit] <= excitation; unit++)
        {
            force += twitches[unit] * Fusion(contractionSeconds[unit] * RateAt(unit, excitation));
        }

        return force;
    }

    /// <summary>The smallest excitation whose force reaches a share of the maximum, 0 to 1; by table, to 1e-4.</summary>
    public double ExcitationAt(double forceFraction) => inverse.Value.At(forceFraction);

    /// <summary>Impulses per second of a unit that is in, counted from 0.</summary>
    internal double RateAt(int unit, double excitation) => Math.Min(peakRates[unit], LowestRate + excitation - thresholds[unit]);

    /// <summary>Force of a unit as a share of its twitch force at full fusion, over the normalised rate (contraction time times
    /// rate).</summary>
    internal static double Fusion(double normalisedRate)
    {
        const double Bend = 0.4;
        return normalisedRate <= Bend ? normalisedRate / Bend * Sigmoid(Bend) : Sigmoid(normalisedRate);
    }

    private static double Sigmoid(double normalisedRate) => 1 - Math.Exp(-2 * normalisedRate * normalisedRate * normalisedRate);
}
