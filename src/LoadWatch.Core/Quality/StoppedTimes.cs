using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Quality;

/// <summary>When the timer of a recording stood: stretches that do not overlap, in time order.</summary>
internal sealed class StoppedTimes
{
    private readonly List<(long Start, long End)> stretches = [];

    private StoppedTimes()
    {
    }

    public static StoppedTimes None { get; } = new();

    public int Count => stretches.Count;

    public (long Start, long End) this[int at] => stretches[at];

    /// <param name="pauses">In any order; one that never ended lasts.</param>
    public static StoppedTimes Of(IReadOnlyList<Pause> pauses)
    {
        if (pauses.Count == 0)
        {
            return None;
        }

        var stopped = new StoppedTimes();
        foreach (var pause in pauses.OrderBy(pause => pause.Start))
        {
            stopped.Add(pause.Start.ToUnixTimeMilliseconds(), pause.End is { } end ? end.ToUnixTimeMilliseconds() : long.MaxValue);
        }

        return stopped;
    }

    /// <summary>The parts of pauses that lie within a stretch.</summary>
    public static IEnumerable<Pause> Within(IReadOnlyList<Pause> pauses, Activities.Stretch stretch)
    {
        var (from, to) = (Moment(stretch.From) ?? Instant.MinValue, Moment(stretch.To));
        return pauses
            .Where(pause => !(pause.End <= from) && !(pause.Start >= to))
            .Select(pause => new Pause(Instant.Max(pause.Start, from), pause.End is { } end ? Instant.Min(end, to ?? end) : to));
    }

    private static Instant? Moment(long? unixMilliseconds) => unixMilliseconds is { } known ? Instant.FromUnixTimeMilliseconds(known) : null;

    private void Add(long start, long end)
    {
        if (stretches.Count > 0 && start <= stretches[^1].End)
        {
            stretches[^1] = (stretches[^1].Start, Math.Max(end, stretches[^1].End));
        }
        else if (start < end)
        {
            stretches.Add((start, end));
        }
    }
}
