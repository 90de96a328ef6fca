using NodaTime;

namespace LoadWatch.People;

/// <summary>What an anchor is a value of. The unit belongs to the kind (<see cref="AnchorKinds"/>).</summary>
public enum AnchorKind
{
    HeartRateRest,
    HeartRateMax,
    HeartRateVt1,
    HeartRateVt2,

    /// <summary>The factor a of a person's own training impulse.</summary>
    TrimpWeight,

    /// <summary>The exponent b of a person's own training impulse.</summary>
    TrimpExponent,
    CriticalPower,
    WPrime,
    PowerMax,
    CriticalSpeed,
    DPrime,
    SpeedMax,
    OneRepetitionMax,
    BodyMass,
    Height,
}

/// <summary>Where an anchor's value comes from; a measured one always wins.</summary>
public enum AnchorSource
{
    Measured,

    /// <summary>From the person's own recordings.</summary>
    Observed,

    /// <summary>By a named equation.</summary>
    Estimated,
}

/// <summary>A dated personal reference value.</summary>
/// <param name="Person">Id of the person.</param>
/// <param name="Date">First day on which it holds; null holds from the beginning.</param>
/// <param name="Value">In the unit of its kind.</param>
/// <param name="Exercise">The exercise of a one-repetition maximum; null for every other kind.</param>
/// <param name="Note">How it came about: the test, or the equation with its authors and year.</param>
/// <param name="Machine">The machine of a one-repetition maximum, in the gym's own words; null holds without a machine and for every machine that has
/// none of its own.</param>
public sealed record Anchor(
    string Person,
    LocalDate? Date,
    AnchorKind Kind,
    double Value,
    AnchorSource Source,
    string? Exercise = null,
    string? Note = null,
    string? Machine = null)
{
    /// <summary>The sport of a capacity of power, as its family's word (<see cref="Recordings.Sport.Family"/>); null holds for every sport but those on foot. Null for
    /// every other kind.</summary>
    public string? Sport { get; init; }

    /// <summary>When it was shown, where that is another date than the first on which it holds; null: on that date.</summary>
    public LocalDate? ShownOn { get; init; }
}
