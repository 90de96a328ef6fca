namespace LoadWatch.Stimulus;

/// <summary>Makes bands from three readings.</summary>
public static class Bands
{
    /// <summary>The middle reading stays; the outer ones are ordered around it, since merged bouts can make a harder reading count
    /// fewer.</summary>
    public static Band Of(double low, double mid, double high) => new(
        Significant.Round(Math.Min(mid, Math.Min(low, high))),
        Significant.Round(mid),
        Significant.Round(Math.Max(mid, Math.Max(low, high))));

    /// <summary>The same for one figure of three readings.</summary>
    public static Band Of<T>(T low, T mid, T high, Func<T, double> figure) => Of(figure(low), figure(mid), figure(high));
}
