using System.Diagnostics;

namespace LoadWatch.Service.Pipeline;

/// <summary>How long a sweep goes on with work that may wait for the next one: the first piece is always begun, so that every sweep gets on.</summary>
/// <param name="limit">Null never ends.</param>
public sealed class Patience(TimeSpan? limit)
{
    private readonly long start = Stopwatch.GetTimestamp();
    private bool hasBegun;

    public static Patience Endless => new(null);

    /// <summary>Whether another piece may begin.</summary>
    public bool AllowsMore()
    {
        var allows = !hasBegun || limit is null || Stopwatch.GetElapsedTime(start) < limit;
        hasBegun = true;
        return allows;
    }
}
