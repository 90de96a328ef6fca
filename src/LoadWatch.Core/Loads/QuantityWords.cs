using System.Globalization;

namespace LoadWatch.Loads;

/// <summary>Names of quantities in the words of a sentence, singular.</summary>
public static class QuantityWords
{
    private const string DistanceUnit = "_m_s";

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
        QuantityNames.Accelerations => "number of accelerations",
        QuantityNames.Decelerations => "number of decelerations",
        QuantityNames.PowerTop => "top power",
        QuantityNames.Minutes => "training time",
        QuantityNames.Distance => "distance",
        QuantityNames.Climb => "climb",
        QuantityNames.SpeedTop => "top speed",
        QuantityNames.Work => "work",
        QuantityNames.Sets => "number of sets",
        QuantityNames.Repetitions => "number of repetitions",
        QuantityNames.Kilograms => "weight lifted",
        _ when name.StartsWith(QuantityNames.OneRepetitionMaxOf, StringComparison.Ordinal) =>
            $"estimated maximum of {name[QuantityNames.OneRepetitionMaxOf.Length..].Replace('_', ' ')}",
        _ => BoundOf(name) is { } bound ? $"distance at {bound} m/s and faster" : $"\"{name.Replace('_', ' ')}\"",
    };

    /// <summary>The reverse of <see cref="DistanceAbove.Name"/>.</summary>
    private static string? BoundOf(string name)
    {
        if (!name.StartsWith(DistanceAbove.Prefix, StringComparison.Ordinal) || !name.EndsWith(DistanceUnit, StringComparison.Ordinal))
        {
            return null;
        }

        var bound = name[DistanceAbove.Prefix.Length..Math.Max(DistanceAbove.Prefix.Length, name.Length - DistanceUnit.Length)].Replace('_', '.');
        return double.TryParse(bound, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out _) ? bound : null;
    }
}
