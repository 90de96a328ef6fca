// Best means: for each of some durations, the highest mean of a channel over any unbroken stretch of that length. Common practice, no published source.
// A mean is weighted by the time for which readings stand; a window lies within one stretch without a gap, since what happened in a gap is unknown. Windows begin at
// whole seconds after the beginning of their stretch, those shorter than a minute of a channel recorded more often than once a second at whole tenths. At one reading a
// second, and at ten, no window is missed; elsewhere the figure is a lower bound.
// Cost: readings plus seconds times durations, by sums that run on.
using LoadWatch.Activities;

namespace LoadWatch.Capacity;

/// <summary>The best means of one channel of a session, in the channel's unit.</summary>
public sealed class BestMeans
{
    /// <summary>From 1 s to 60 min, each at most a half longer than the one before but for the first few.</summary>
    private static readonly int[] Grid =
    [
        1, 2, 3, 4, 5, 6, 8, 10, 12, 15, 20, 25, 30, 40, 50, 60, 80, 100, 120, 150, 180, 240, 300, 360, 420, 480, 600, 720, 900, 1200, 1500, 1800, 2400, 3000, 3600,
    ];

    private const int FineBelowSeconds = 60;
    private const int FineMilliseconds = 100;
    private const int CoarseMilliseconds = 1000;

    private readonly double[] values;

    /// <param name="values">The best mean of each duration from the shortest on, finite; as many as are known.</param>
    public BestMeans(IEnumerable<double> values)
    {
        this.values = [.. values];
        if (this.values.Length > Grid.Length || !Array.TrueForAll(this.values, double.IsFinite))
        {
            throw new ArgumentException($"at most {Grid.Length} finite means", nameof(values));
        }
    }

    /// <summary>Seconds, rising.</summary>
    public static IReadOnlyList<int> Durations => Grid;

    /// <summary>The best mean of each duration from the shortest on, rounded to 9 significant digits; shorter than <see cref="Durations"/> where no stretch lasted as long.</summary>
    public IReadOnlyList<double> Values => values;

    /// <summary>Null where no unbroken stretch lasted as long, and for a duration that is none of <see cref="Durations"/>.</summary>
    public double? this[int seconds] => Array.BinarySearch(Grid, seconds) is >= 0 and var at && at < values.Length ? values[at] : null;

    /// <summary>Without any value where no second is usable without a gap.</summary>
    public static BestMeans Of(UsableChannel channel)
    {
        ArgumentNullException.ThrowIfNull(channel);
        var best = new double[Grid.Length];
        Array.Fill(best, double.NegativeInfinity);
        var fine = IsFine(channel.Milliseconds) ? Array.FindIndex(Grid, seconds => seconds >= FineBelowSeconds) : 0;
        RunningSums.Search(channel, FineMilliseconds, Grid.AsSpan(0, fine), best);
        RunningSums.Search(channel, CoarseMilliseconds, Grid.AsSpan(fine), best.AsSpan(fine));
        return new BestMeans(best.TakeWhile(double.IsFinite).Select(Significant.Round));
    }

    /// <summary>Whether most readings stand for less than a second.</summary>
    private static bool IsFine(ReadOnlySpan<int> milliseconds)
    {
        var (shorter, held) = (0, 0);
        foreach (var duration in milliseconds)
        {
            shorter += duration is > 0 and < CoarseMilliseconds ? 1 : 0;
            held += duration > 0 ? 1 : 0;
        }

        return shorter > held / 2;
    }
}
