namespace LoadWatch.Loads;

/// <summary>The load of a session and where it comes from.</summary>
/// <param name="Value">In the unit of the group's load, rounded to 9 significant digits.</param>
/// <param name="Estimated">True where it was converted, or where the quantity itself rests on an estimate.</param>
/// <param name="From">Name of the quantity that it was taken or converted from.</param>
/// <param name="Line">What converted it; null where the session has the group's load itself.</param>
public sealed record ChosenLoad(double Value, bool Estimated, string From, ConversionLine? Line)
{
    /// <summary>
    /// Standard error of estimate of the line that converted it, in the unit of the group's load; null without one. How sure the line itself is does not add to it:
    /// with 10 pairs or more that is the smaller part near their middle, and more at their ends.
    /// </summary>
    public double? StandardError => Line?.StandardError;
}
