// One and the same heart rate for longer than a minute is possible while the load is steady; while it varies it is a sensor that hangs. Heart rate follows the
// load late (half of a step within about 20 s, a first-order lag of 20 to 40 s), so the last half minute of a flat line is not asked for changes.
namespace LoadWatch.Quality;

/// <summary>Cuts heart rate that stood still while the load varied.</summary>
internal static class FlatLine
{
    private const long LagMilliseconds = 30_000;

    // A line that is not looked at for longer is none.
    private const long MostApartMilliseconds = 10_000;

    public static void Cut(ReadOnlySpan<long> times, ReadOnlySpan<double> bpm, int longestSeconds, LoadChange load, ReadingMarks marks)
    {
        if (!load.IsKnown)
        {
            return;
        }

        var known = marks.ByRow;
        var (first, before) = (-1, -1);
        for (var row = 0; row < times.Length && row < bpm.Length; row++)
        {
            if (!known.IsEmpty && known[row] != 0)
            {
                continue;
            }

            if (before < 0 || bpm[row] != bpm[first] || Moments.Between(times[before], times[row]) > MostApartMilliseconds)
            {
                Close(times, first, before, longestSeconds, load, marks);
                first = row;
            }

            before = row;
        }

        Close(times, first, before, longestSeconds, load, marks);
    }

    private static void Close(ReadOnlySpan<long> times, int first, int last, int longestSeconds, LoadChange load, ReadingMarks marks)
    {
        if (first >= 0 && Moments.Between(times[first], times[last]) > longestSeconds * 1000L && load.Varies(times[first], times[last] - LagMilliseconds))
        {
            marks.Cut(first, last, CutReason.FlatLine);
        }
    }
}
