namespace LoadWatch.People;

/// <summary>Names, units and plausible ranges of the anchor kinds, as files write them.</summary>
public static class AnchorKinds
{
    private static readonly Dictionary<AnchorKind, AnchorKindInfo> Table = new AnchorKindInfo[]
    {
        new(AnchorKind.HeartRateRest, "heart_rate_rest", "bpm", 25, 120),
        new(AnchorKind.HeartRateMax, "heart_rate_max", "bpm", 80, 240),
        new(AnchorKind.HeartRateVt1, "heart_rate_vt1", "bpm", 60, 230),
        new(AnchorKind.HeartRateVt2, "heart_rate_vt2", "bpm", 60, 235),
        new(AnchorKind.TrimpWeight, "trimp_weight", "1", 0.01, 5),
        new(AnchorKind.TrimpExponent, "trimp_exponent", "1", 0.1, 8),
        new(AnchorKind.CriticalPower, "critical_power", "W", 20, 600),
        new(AnchorKind.WPrime, "w_prime", "J", 1000, 60000),
        new(AnchorKind.PowerMax, "power_max", "W", 50, 3000),
        new(AnchorKind.CriticalSpeed, "critical_speed", "m/s", 0.5, 8),
        new(AnchorKind.DPrime, "d_prime", "m", 20, 600),
        new(AnchorKind.SpeedMax, "speed_max", "m/s", 1, 13),
        new(AnchorKind.OneRepetitionMax, "one_repetition_max", "kg", 1, 1000),
        new(AnchorKind.BodyMass, "body_mass", "kg", 20, 300),
        new(AnchorKind.Height, "height", "m", 0.8, 2.6),
    }.ToDictionary(info => info.Kind);

    public static IEnumerable<AnchorKindInfo> All => Table.Values;

    public static AnchorKindInfo Of(AnchorKind kind) => Table[kind];

    /// <summary>Whether an anchor of the kind may be of one sport: what somebody can do on a bicycle says little of the rowing machine.</summary>
    public static bool IsOfSport(AnchorKind kind) => kind is AnchorKind.CriticalPower or AnchorKind.WPrime or AnchorKind.PowerMax;
}

/// <param name="Name">As written in <c>anchors.csv</c>.</param>
/// <param name="Unit">The only unit taken; <c>1</c> for a pure number.</param>
/// <param name="Lowest">Smallest value taken, inclusive.</param>
/// <param name="Highest">Largest value taken, inclusive.</param>
public sealed record AnchorKindInfo(AnchorKind Kind, string Name, string Unit, double Lowest, double Highest);
