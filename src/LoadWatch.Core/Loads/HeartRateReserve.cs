using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// The span between resting and maximal heart rate. Source: Karvonen, Kentala and Mustala 1957, The effects of training on heart rate,
/// Ann Med Exp Biol Fenn 35:307-315 (from memory). x = (HR - HRrest) / (HRmax - HRrest), bpm in, dimensionless out.
/// Departure: x below 0 or above 1 is taken as 0 or 1, since a rate outside the anchored span says that an anchor is off, not that load is
/// negative or endless.
/// </summary>
/// <param name="RestBpm">Resting heart rate.</param>
/// <param name="MaxBpm">Maximal heart rate, above the resting one.</param>
/// <param name="Estimated">True when one of the two comes from an equation.</param>
public sealed record HeartRateReserve(double RestBpm, double MaxBpm, bool Estimated)
{
    private const string NoBound = "no heart_rate_rest, and neither heart_rate_max nor a birth year: no load by heart-rate reserve";
    private const string NoRest = "no heart_rate_rest: no load by heart-rate reserve";
    private const string NoMax = "neither heart_rate_max nor a birth year: no load by heart rate";
    private const string NoSpan = "heart_rate_max is not above heart_rate_rest: no load by heart-rate reserve";

    /// <summary>Every reason that <see cref="On"/> may give.</summary>
    public static IReadOnlyList<string> EveryMissing { get; } = [NoBound, NoRest, NoMax, NoSpan];

    /// <summary>The reserve on a date, or null with the reason in plain words.</summary>
    public static (HeartRateReserve? Reserve, string? Missing) On(LocalDate date, Person person, AnchorBook anchors)
    {
        var rest = anchors.On(date, person.Id, AnchorKind.HeartRateRest);
        var max = HeartRateMaximum.On(date, person, anchors);
        return (rest, max) switch
        {
            (null, null) => (null, NoBound),
            (null, _) => (null, NoRest),
            (_, null) => (null, NoMax),
            _ when max.Bpm <= rest.Value => (null, NoSpan),
            _ => (new HeartRateReserve(rest.Value, max.Bpm, max.Estimated || rest.Source == AnchorSource.Estimated), null),
        };
    }

    /// <summary>Fraction of the reserve, 0 to 1.</summary>
    public double Fraction(double bpm) => Math.Clamp(Unclamped(bpm), 0, 1);

    /// <summary>The same without the clamp.</summary>
    public double Unclamped(double bpm) => (bpm - RestBpm) / (MaxBpm - RestBpm);

    /// <summary>The heart rate at a fraction of the reserve, bpm.</summary>
    public double BpmAt(double fraction) => RestBpm + (fraction * (MaxBpm - RestBpm));
}
