namespace LoadWatch.Loads;

/// <summary>The unit of a group's load, in texts and over columns.</summary>
public static class LoadUnits
{
    /// <summary>The unit of a built-in quantity; for any other its name in words.</summary>
    public static string Of(string quantity) => quantity switch
    {
        QuantityNames.BanisterTrimp or QuantityNames.EdwardsLoad or QuantityNames.LuciaLoad or QuantityNames.StagnoLoad
            or QuantityNames.IndividualTrimp or QuantityNames.FosterLoad => "AU",
        QuantityNames.Minutes or QuantityNames.MinutesModerate or QuantityNames.MinutesVigorous => "min",
        QuantityNames.Distance or QuantityNames.Climb => "m",
        _ when quantity.StartsWith(DistanceAbove.Prefix, StringComparison.Ordinal) => "m",
        QuantityNames.Work => "kJ",
        QuantityNames.Kilograms => "kg",
        _ => OneLine.Of(quantity.Replace('_', ' ')),
    };
}
