namespace LoadWatch.Stimulus;

/// <summary>
/// Shares of the three classes in the pool's summed twitch force, together 1. Source of the usual ones: Staron et al. 2000, Fiber type
/// composition of the
/// vastus lateralis muscle of young men and women, J Histochem Cytochem 48:623-629: 41 % I, 31 % IIA, 20 % IIB; intermediate fibres shared
/// out: 43/34/23 %.
/// The split by summed force rather than by count is an assumption: larger units hold more fibres.
/// </summary>
/// <param name="Slow">Slow units (type I), 0 to 1.</param>
/// <param name="Medium">Fatigue-resistant fast units (type IIA), 0 to 1.</param>
public sealed record ClassShares(double Slow, double Medium)
{
    public static ClassShares Usual { get; } = new(0.43, 0.34);

    /// <summary>Number of units in each class of a pool, cut at the nearest unit.</summary>
    public (int Slow, int Medium, int Large) Split(MotorUnitPool pool)
    {
        var slow = UnitsUpTo(Slow, pool);
        var medium = UnitsUpTo(Slow + Medium, pool) - slow;
        return (slow, medium, MotorUnitPool.Units - slow - medium);
    }

    private static int UnitsUpTo(double share, MotorUnitPool pool)
    {
        var wanted = share * pool.Twitches.Sum();
        var (sum, units) = (0.0, 0);
        while (units < MotorUnitPool.Units && sum + (pool.Twitches[units] / 2) <= wanted)
        {
            sum += pool.Twitches[units++];
        }

        return units;
    }
}
