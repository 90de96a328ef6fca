using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>Which quantities a session of a sport can hold at all. Common practice, no published source.</summary>
public static class QuantitySports
{
    private const string Training = "training";

    /// <summary>True also where it is not known: then a session without the quantity leaves it unknown.</summary>
    public static bool MayHold(string quantity, Sport sport) => quantity switch
    {
        QuantityNames.Sets or QuantityNames.Repetitions or QuantityNames.Kilograms => !IsEndurance(sport),
        QuantityNames.Accelerations or QuantityNames.Decelerations => !IsEndurance(sport) && sport.Name != Training || sport.IsOnFoot || sport.IsTeamSport,
        QuantityNames.Distance or QuantityNames.Climb => sport.Name != Training,
        QuantityNames.MinutesModerate or QuantityNames.MinutesVigorous => sport.IsOnFoot || sport.Family == "cycling" || sport.Name == Sport.Generic.Name,
        _ when quantity.StartsWith(DistanceAbove.Prefix, StringComparison.Ordinal) => sport.IsOnFoot || sport.IsTeamSport || sport.Name == Sport.Generic.Name,
        _ => true,
    };

    private static bool IsEndurance(Sport sport) => sport.IsOnFoot || sport.IsTeamSport || sport.Name is "cycling" or "rowing" or "swimming" or "cross_country_skiing";
}
