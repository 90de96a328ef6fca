using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>A person's own weighting of heart rate, a exp(b x), from one incremental test.</summary>
/// <param name="A">Factor, dimensionless, above 0.</param>
/// <param name="B">Exponent, dimensionless, above 0.</param>
/// <param name="Estimated">True when one of the two comes from an equation.</param>
public sealed record TrimpPair(double A, double B, bool Estimated)
{
    private const string NoWeight = "trimp_exponent without trimp_weight: no individual training impulse";
    private const string NoExponent = "trimp_weight without trimp_exponent: no individual training impulse";
    private const string TwoDates = "trimp_weight and trimp_exponent are of different dates: no individual training impulse";

    /// <summary>Every reason that <see cref="On"/> may give.</summary>
    public static IReadOnlyList<string> EveryMissing { get; } = [NoWeight, NoExponent, TwoDates];

    /// <summary>
    /// The pair on a date. Both come out of one fit, and one of them means nothing without the other: two of different dates are no pair. No
    /// reason is given where neither is anchored, since most people have none.
    /// </summary>
    public static (TrimpPair? Pair, string? Missing) On(LocalDate date, Person person, AnchorBook anchors)
    {
        var a = anchors.On(date, person.Id, AnchorKind.TrimpWeight);
        var b = anchors.On(date, person.Id, AnchorKind.TrimpExponent);
        return (a, b) switch
        {
            (null, null) => (null, null),
            (null, _) => (null, NoWeight),
            (_, null) => (null, NoExponent),
            _ when a.Date != b.Date => (null, TwoDates),
            _ => (new TrimpPair(a.Value, b.Value, a.Source == AnchorSource.Estimated || b.Source == AnchorSource.Estimated), null),
        };
    }
}
