namespace LoadWatch.Stimulus;

/// <summary>The three readings that make a band.</summary>
public sealed record Variants(Variant Low, Variant Mid, Variant High)
{
    /// <summary>Full years from which on the band is wider. A choice: so are the other bounds of age here.</summary>
    public const int OlderFrom = 60;

    public static Variants Usual { get; } = new(Variant.Low, Variant.Mid, Variant.High);

    /// <summary>
    /// Fast fibres shrink and units are lost with age (Lexell 1995; Piasecki et al. 2016), by how much in one person nobody knows: half as much again to either side,
    /// shares by 15 points and the anchor by 0.075. An assumption. The middle stays: ageing it would only make heavier loads necessary to count.
    /// </summary>
    public static Variants Older { get; } = new(
        new Variant(new Recruitment(MotorUnitPool.Broad, new ClassShares(0.58, 0.34)), 0.575, -1),
        Variant.Mid,
        new Variant(new Recruitment(MotorUnitPool.Narrow, new ClassShares(0.28, 0.34)), 0.725, 1));

    /// <param name="age">Full years, or null where unknown: read as usual.</param>
    public static Variants Of(int? age) => age >= OlderFrom ? Older : Usual;
}
