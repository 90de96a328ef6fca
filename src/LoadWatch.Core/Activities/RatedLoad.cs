using LoadWatch.Loads;

namespace LoadWatch.Activities;

/// <summary>
/// Load of a session from its rating of effort. Source: Foster et al. 2001, A new approach to monitoring exercise training, J Strength Cond Res
/// 15:109-115: load = rating (0 to 10) x minutes of the session, arbitrary units.
/// </summary>
internal static class RatedLoad
{
    /// <summary>Rating of effort of a whole session, 0 to 10 points (points).</summary>
    public const string Rating = "rating";

    public const string RatingUnit = "points";

    private const string Name = "foster_load";

    /// <summary>Null without both.</summary>
    public static Quantity? Of(Quantity? rating, Quantity? minutes) => rating is null || minutes is null
        ? null
        : new Quantity(Name, Significant.Round(rating.Value * minutes.Value), "AU", rating.Estimated || minutes.Estimated);
}
