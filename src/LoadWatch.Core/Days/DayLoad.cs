namespace LoadWatch.Days;

/// <summary>The load of a date from those of its sessions.</summary>
internal static class DayLoad
{
    /// <summary>0 for rest; null when unknown or when one of the sessions that add load has none: a part of a day is not the day.</summary>
    /// <param name="adding">Loads of the sessions that add to the date, in key order, so that the sum does not hang on theirs (I-5).</param>
    public static double? Of(DayState state, IReadOnlyList<double?> adding) => state switch
    {
        DayState.Rest => 0,
        DayState.Recorded when adding.Count > 0 => Significant.Round(Sum(adding)),
        _ => null,
    };

    /// <summary>The root of the sum of squares of the errors that there are; null without any.</summary>
    /// <param name="errors">Of the sessions that add to the date, in key order.</param>
    public static double? ErrorOf(IEnumerable<double?> errors)
    {
        double? squares = null;
        foreach (var error in errors)
        {
            squares = error is { } known ? squares.GetValueOrDefault() + (known * known) : squares;
        }

        return squares is { } sum && double.IsFinite(sum) ? Significant.Round(Math.Sqrt(sum)) : null;
    }

    private static double? Sum(IReadOnlyList<double?> adding)
    {
        double? sum = 0;
        for (var index = 0; index < adding.Count; index++)
        {
            sum += adding[index];
        }

        return sum;
    }
}
