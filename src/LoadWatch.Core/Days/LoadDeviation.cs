namespace LoadWatch.Days;

/// <summary>Which standard deviation of the seven daily loads of a week monotony divides by: the source does not say.</summary>
public enum LoadDeviation
{
    /// <summary>Over n - 1, as spreadsheets give it.</summary>
    Sample,

    /// <summary>Over n: monotony is larger by the root of 7/6, 8 %.</summary>
    Population,
}
