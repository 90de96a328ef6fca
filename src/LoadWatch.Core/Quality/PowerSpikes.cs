// Power may rise by a thousand watts within a second where somebody sprints, so a fast change says nothing. One reading alone, a thousand watts above those just
// before and just after it, is no sprint: even the shortest lasts longer. An assumption, no published source.
namespace LoadWatch.Quality;

/// <summary>Cuts single readings that tower above both of their neighbours.</summary>
internal static class PowerSpikes
{
    private const double AboveWatts = 1000;
    private const int NeighbourMilliseconds = 2000;

    public static void Cut(ReadOnlySpan<long> times, ReadOnlySpan<double> watts, ReadingMarks marks)
    {
        var known = marks.ByRow;
        var (two, one) = (-1, -1);
        for (var row = 0; row < times.Length && row < watts.Length; row++)
        {
            if (!known.IsEmpty && known[row] != 0)
            {
                continue;
            }

            if (two >= 0 && watts[one] > AboveWatts && Towers(watts[two], watts[one], watts[row]) && IsClose(times, two, one) && IsClose(times, one, row))
            {
                marks.Cut(one, CutReason.Spike);
            }

            (two, one) = (one, row);
        }
    }

    private static bool Towers(double before, double reading, double after) => reading - Math.Max(before, after) > AboveWatts;

    private static bool IsClose(ReadOnlySpan<long> times, int row, int next) => Moments.Between(times[row], times[next]) <= NeighbourMilliseconds;
}
