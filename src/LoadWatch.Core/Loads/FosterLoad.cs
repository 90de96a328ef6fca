namespace LoadWatch.Loads;

/// <summary>
/// Load of a session by the person's own rating of effort. Sources: Foster 1998, Monitoring training in athletes with reference to overtraining
/// syndrome, Med Sci Sports Exerc 30:1164-1168; Foster et al. 2001, A new approach to monitoring exercise training, J Strength Cond Res 15:109-115
/// (titles from memory).
/// Load = R x D: R the rating of the whole session on the category-ratio scale of 0 (rest) to 10 (maximal), D its minutes.
/// Departure: the rating may come at any time. The papers ask for it 30 minutes after the session; Foster et al. 2021, Int J Sports Physiol Perform
/// 16:612-621, find it the same from a minute to 14 days after.
/// </summary>
public static class FosterLoad
{
    public const double LowestRating = 0;

    public const double HighestRating = 10;

    /// <summary>Arbitrary units, 0 or more; null where one of the two is unknown or cannot be.</summary>
    /// <param name="rating">Points, 0 to 10.</param>
    /// <param name="minutes">Above 0.</param>
    public static double? Of(double? rating, double? minutes) =>
        rating is >= LowestRating and <= HighestRating && minutes is > 0 and <= double.MaxValue / HighestRating
            ? Significant.Round(rating * minutes)
            : null;
}
