namespace LoadWatch.Days;

/// <summary>Which standard deviation of the seven daily loads of a week monotony divides by: the source does not say.</summary>
public enum LoadDeviation
{
    /// <summary>Over n - 1, as spreadsheets give it.</summary>
    Sample,

    /// <summary>Over n: monotony is larger by the root of 7/6, 8 %.</summary>
    Population,
}

public static class LoadDeviations
{
    /// <summary>What is divided by, as a formula writes it: <c>n - 1</c>.</summary>
    public static string Divisor(this LoadDeviation deviation) => deviation == LoadDeviation.Sample ? "n - 1" : "n";
}
