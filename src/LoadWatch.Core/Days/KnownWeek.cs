using System.Text.Json.Serialization;

namespace LoadWatch.Days;

/// <summary>What is known of seven days in a row.</summary>
/// <param name="Sum">Load of the known days.</param>
/// <param name="Days">Days with known load, count.</param>
/// <param name="Trained">Sessions that are known: days with a known load above 0, count.</param>
/// <param name="Sessions">Sessions that there were to be: days with training, or those on which the plan expects a recording where these are more, count.</param>
/// <param name="IsPlanned">Whether a plan tells of a recording to come on one of the days.</param>
internal readonly record struct KnownWeek(double Sum, int Days, int Trained, int Sessions, bool IsPlanned)
{
    private const int Length = 7;

    /// <summary>The whole is told by the known sessions.</summary>
    [JsonIgnore]
    public bool IsScaledToSessions => Days < Length && Sessions > Trained;

    /// <summary>The whole is told by the known days: without a plan, and where no session is missing, those of which nothing says whether there was training count as they do.</summary>
    [JsonIgnore]
    public bool IsScaledToDays => Days < Length && Sessions == Trained && !IsPlanned;

    /// <summary>The load as if every session were known; null where none is, but some were to be.</summary>
    [JsonIgnore]
    public double? Whole =>
        IsScaledToDays ? Sum * Length / Days
        : !IsScaledToSessions ? Sum
        : Trained == 0 ? null
        : Sum * Sessions / Trained;
}
