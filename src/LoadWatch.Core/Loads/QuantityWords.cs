using System.Globalization;

namespace LoadWatch.Loads;

/// <summary>Names of quantities in the words of a sentence, singular.</summary>
public static class QuantityWords
{
    /// <summary><c>distance at 5.5 m/s and faster</c>; a name that is not built in stands in quotes.</summary>
    public static string Of(string name) => name switch
    {
        QuantityNames.BanisterTrimp => "training impulse",
        QuantityNames.EdwardsLoad => "load by zones of maximal heart rate",
        QuantityNames.LuciaLoad => "load by ventilatory thresholds",
        QuantityNames.StagnoLoad => "team-sport load",
        QuantityNames.IndividualTrimp => "training impulse of own weighting",
        QuantityNames.FosterLoad => "load by rating of effort",
        QuantityNames.Rating => "rating of effort",
        QuantityNames.Minutes => "training time",
        QuantityNames.MinutesModerate => "time of moderate effort and more",
        QuantityNames.MinutesVigorous => "time of vigorous effort",
        QuantityNames.Distance => "distance",
        QuantityNames.Climb => "climb",
        QuantityNames.SpeedTop => "top speed",
        QuantityNames.SpeedTopShare => "share of the own top speed",
        QuantityNames.PowerTop => "top power",
        QuantityNames.Accelerations => "number of accelerations",
        QuantityNames.Decelerations => "number of decelerations",
        QuantityNames.Work => "work",
        QuantityNames.Sets => "number of sets",
        QuantityNames.Repetitions => "number of repetitions",
        QuantityNames.Kilograms => "weight lifted",
        _ when BoundOf(name, DistanceAbove.Prefix, "_m_s") is { } bound => $"distance at {bound} m/s and faster",
        _ when BoundOf(name, DistanceAbove.Prefix, "_percent_speed_max") is { } share => $"distance at {share} % of the own top speed and faster",
        _ when name.StartsWith(QuantityNames.OneRepetitionMaxOf, StringComparison.Ordinal) =>
            $"estimated maximum of {name[QuantityNames.OneRepetitionMaxOf.Length..].Replace('_', ' ')}",
        _ => $"\"{name.Replace('_', ' ')}\"",
    };

    /// <summary><c>5.5</c> of <c>distance_above_5_5_m_s</c>; null for any other name.</summary>
    private static string? BoundOf(string name, string prefix, string ending)
    {
        if (name.Length <= prefix.Length + ending.Length
            || !name.StartsWith(prefix, StringComparison.Ordinal)
            || !name.EndsWith(ending, StringComparison.Ordinal))
        {
            return null;
        }

        var bound = name[prefix.Length..^ending.Length].Replace('_', '.');
        return double.TryParse(bound, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out _) ? bound : null;
    }
}
