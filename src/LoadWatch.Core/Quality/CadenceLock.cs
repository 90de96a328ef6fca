// Light sensors at the wrist may take the rhythm of steps, 165 to 185 a minute, for that of the heart. Three signs together, an assumption: within 3 of the rhythm
// for half a minute or more; a step of heart rate where that begins; a load that varies all the while. A true heart rate may pass the step rate or stay at it, but
// not with all three. Cadence is kept in whole cycles, so on foot the rhythm of steps is twice it.
using LoadWatch.Activities;

namespace LoadWatch.Quality;

/// <summary>Cuts heart rate that follows the cadence.</summary>
internal static class CadenceLock
{
    private const double WithinBpm = 3;
    private const double StepBpm = 15;
    private const long StepMilliseconds = 10_000;

    // Load is looked at from a little before, as its change begins there.
    private const long LeadMilliseconds = 15_000;
    private const long MostApartMilliseconds = 10_000;

    /// <param name="cycles">1 for the cadence itself, 2 for twice it.</param>
    public static void Cut(
        ReadOnlySpan<long> times, ReadOnlySpan<double> bpm, UsableChannel cadence, int cycles, int leastSeconds, LoadChange load, ReadingMarks marks)
    {
        var known = marks.ByRow;
        var cadenceTimes = cadence.UnixMilliseconds;
        var cadences = cadence.Values;
        var (first, before, at) = (-1, -1, -1);
        for (var row = 0; row < times.Length && row < bpm.Length; row++)
        {
            if (!known.IsEmpty && known[row] != 0)
            {
                continue;
            }

            while (at + 1 < cadenceTimes.Length && cadenceTimes[at + 1] <= times[row])
            {
                at++;
            }

            var follows = at >= 0 && Math.Abs(bpm[row] - (cycles * cadences[at])) <= WithinBpm && Moments.Between(cadenceTimes[at], times[row]) <= MostApartMilliseconds;
            if (first >= 0 && (!follows || Moments.Between(times[before], times[row]) > MostApartMilliseconds))
            {
                Close(times, bpm, first, before, leastSeconds, load, marks);
                first = -1;
            }

            first = follows && first < 0 ? row : first;
            before = row;
        }

        Close(times, bpm, first, before, leastSeconds, load, marks);
    }

    private static void Close(ReadOnlySpan<long> times, ReadOnlySpan<double> bpm, int first, int last, int leastSeconds, LoadChange load, ReadingMarks marks)
    {
        if (first >= 0
            && Moments.Between(times[first], times[last]) >= leastSeconds * 1000L
            && BeginsWithAStep(times, bpm, first, marks.ByRow)
            && load.Varies(Math.Max(times[first], long.MinValue + LeadMilliseconds) - LeadMilliseconds, times[last]))
        {
            marks.Cut(first, last, CutReason.LockedToCadence);
        }
    }

    private static bool BeginsWithAStep(ReadOnlySpan<long> times, ReadOnlySpan<double> bpm, int first, ReadOnlySpan<byte> marks)
    {
        for (var row = first - 1; row >= 0 && Moments.Between(times[row], times[first]) <= StepMilliseconds; row--)
        {
            if ((marks.IsEmpty || marks[row] == 0) && Math.Abs(bpm[row] - bpm[first]) > StepBpm)
            {
                return true;
            }
        }

        return false;
    }
}
