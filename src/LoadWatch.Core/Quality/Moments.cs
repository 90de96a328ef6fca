namespace LoadWatch.Quality;

/// <summary>Arithmetic of times from both ends of their range.</summary>
internal static class Moments
{
    /// <summary>Milliseconds from one time to one that is not before it.</summary>
    public static long Between(long from, long to) => unchecked(to - from) is var apart and >= 0 ? apart : long.MaxValue;

    /// <summary>The sum of two lengths of time.</summary>
    public static long Sum(long one, long other) => unchecked(one + other) is var sum and >= 0 ? sum : long.MaxValue;

    /// <summary>The end of a stretch that begins at a time and holds at least this moment.</summary>
    public static long End(long from, long milliseconds) => from > long.MaxValue - Math.Max(1, milliseconds) ? long.MaxValue : from + Math.Max(1, milliseconds);
}
