namespace LoadWatch.Stimulus;

/// <summary>
/// The pool of motor units as it tires: the reference by which the fast estimator (<see cref="Recruitment"/> at a <see cref="Drive"/>) is judged; the product
/// itself reads the rested pool. Source: Potvin and Fuglevand 2017, A motor unit-based model of muscle fatigue, PLoS Comput Biol 13(6):e1005581.
/// While unit i is in, its twitch force falls by 180^((i-1)/(n-1)) x 0.0225 / 180 x P(i) x NF(i) a second, NF its fused share of force; nothing recovers.
/// Its rate falls by (RTE(i) - 1)/(RTE(n) - 1) x 0.67 (R(i) - 6)(1 - exp(-t/22)), t seconds since it joined; its contraction takes longer by 0.379 of the
/// share of force that it lost. Excitation is taken in steps of 0.01, time in steps of 0.1 s.
/// Domain: one steady isometric hold of a representative muscle, no rest.
/// </summary>
public sealed class FatiguingPool
{
    private const int StepsPerSecond = 10;
    private const int ExcitationsPerUnit = 100;
    private const double FatigabilityRange = 180;
    private const double FastestFatigue = 0.0225;
    private const double Adaptation = 0.67;
    private const double AdaptationSeconds = 22;
    private const double LeavingRate = 6;
    private const double Slowing = 0.379;

    private readonly MotorUnitPool pool;
    private readonly double[] thresholds;
    private readonly double[] rested;
    private readonly double[] fatigues;
    private readonly double[] twitches;
    private readonly int[] stepsIn = new int[MotorUnitPool.Units];
    private readonly int highest;
    private int steps;
    private int excitation;

    public FatiguingPool(MotorUnitPool pool)
    {
        this.pool = pool;
        thresholds = [.. pool.Thresholds];
        rested = [.. pool.Twitches];
        fatigues = [.. rested.Select((twitch, unit) => Math.Pow(FatigabilityRange, unit / (MotorUnitPool.Units - 1.0)) * FastestFatigue / FatigabilityRange * twitch)];
        twitches = [.. rested];
        highest = (int)Math.Round(pool.HighestExcitation * ExcitationsPerUnit);
    }

    /// <summary>Held so far.</summary>
    public double Seconds => (double)steps / StepsPerSecond;

    /// <summary>Of the last step, in the pool's units.</summary>
    public double Excitation => (double)excitation / ExcitationsPerUnit;

    /// <summary>Units in at the last step.</summary>
    public int Recruited => pool.RecruitedAt(Excitation);

    /// <summary>The largest force that is left, as a share of the rested maximum.</summary>
    public double Capacity => ForceAt(highest) / pool.MaximumForce;

    /// <summary>What is left of each unit's twitch force, 0 to 1, smallest unit first.</summary>
    public IReadOnlyList<double> TwitchesLeft => [.. twitches.Zip(rested, (left, whole) => left / whole)];

    /// <summary>How long a force is held from rest, to the first step at which it can't be reached. Null where that lies beyond a limit.</summary>
    /// <param name="forceFraction">Share of the rested maximum, above 0.</param>
    public static double? EnduranceSeconds(double forceFraction, double limitSeconds, MotorUnitPool pool)
    {
        var tired = new FatiguingPool(pool);
        while (tired.Seconds < limitSeconds)
        {
            var at = tired.Seconds;
            if (!tired.Hold(forceFraction))
            {
                return at;
            }
        }

        return null;
    }

    /// <summary>One more step at the smallest excitation that reaches a force, or at the highest.</summary>
    /// <param name="forceFraction">Share of the rested maximum.</param>
    /// <returns>Whether the force was reached.</returns>
    public bool Hold(double forceFraction)
    {
        var wanted = forceFraction * pool.MaximumForce;
        while (excitation > 0 && ForceAt(excitation - 1) >= wanted)
        {
            excitation--;
        }

        while (excitation < highest && ForceAt(excitation) < wanted)
        {
            excitation++;
        }

        var isReached = ForceAt(excitation) >= wanted;
        Tire();
        return isReached;
    }

    private void Tire()
    {
        for (var unit = 0; unit < thresholds.Length && thresholds[unit] <= Excitation; unit++)
        {
            twitches[unit] = Math.Max(0, twitches[unit] - (fatigues[unit] * FusionAt(unit, Excitation) / StepsPerSecond));
            stepsIn[unit]++;
        }

        steps++;
    }

    private double ForceAt(int excitationStep)
    {
        var (at, force) = ((double)excitationStep / ExcitationsPerUnit, 0.0);
        for (var unit = 0; unit < thresholds.Length && thresholds[unit] <= at; unit++)
        {
            force += twitches[unit] * FusionAt(unit, at);
        }

        return force;
    }

    private double FusionAt(int unit, double at)
    {
        var fresh = pool.RateAt(unit, at);
        var place = (thresholds[unit] - 1) / (thresholds[^1] - 1);
        var rate = fresh - (place * Adaptation * (fresh - LeavingRate) * (1 - Math.Exp(-stepsIn[unit] / (StepsPerSecond * AdaptationSeconds))));
        var lost = 1 - (twitches[unit] / rested[unit]);
        return MotorUnitPool.Fusion(pool.ContractionSeconds[unit] * (1 + (Slowing * lost)) * rate);
    }
}
