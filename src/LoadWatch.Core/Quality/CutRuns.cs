using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>Gathers cuts in time order. Of one reason those less than a minute apart are one, further apart where there would be too many.</summary>
/// <param name="channel">Whose; null for rows and time without rows.</param>
internal sealed class CutRuns(Channel? channel)
{
    /// <summary>More of one reason tell nobody anything, and a hostile file cannot fill the store. A choice.</summary>
    public const int MostOfOneReason = 8;

    private const long JoinedMilliseconds = 60_000;

    private readonly List<Run>?[] runs = new List<Run>?[Enum.GetValues<CutReason>().Length];

    /// <summary>Adds one behind those added before.</summary>
    public void Add(CutReason reason, long from, long to, int readings, long milliseconds) =>
        Append(runs[(int)reason] ??= [], new Run(from, to, readings, milliseconds), JoinedMilliseconds);

    /// <summary>By reason, then by time.</summary>
    /// <param name="whole">What the shares are of, milliseconds.</param>
    public IReadOnlyList<Cut> Of(long whole)
    {
        var cuts = new List<Cut>();
        for (var reason = 0; reason < runs.Length; reason++)
        {
            foreach (var run in Bounded(runs[reason] ?? []))
            {
                var share = whole == 0 ? 0 : Significant.Round((double)run.Milliseconds / whole);
                cuts.Add(new Cut(channel, (CutReason)reason, new Stretch(run.From, run.To), run.Readings, run.Milliseconds, share));
            }
        }

        return cuts;
    }

    private static List<Run> Bounded(List<Run> runs)
    {
        for (var apart = JoinedMilliseconds; runs.Count > MostOfOneReason; apart = Moments.Sum(apart, apart))
        {
            var joined = new List<Run>();
            runs.ForEach(run => Append(joined, run, apart));
            runs = joined;
        }

        return runs;
    }

    private static void Append(List<Run> runs, Run next, long apart)
    {
        if (runs.Count == 0 || (next.From > runs[^1].To && Moments.Between(runs[^1].To, next.From) > apart))
        {
            runs.Add(next);
            return;
        }

        var last = runs[^1];
        runs[^1] = new Run(last.From, Math.Max(last.To, next.To), last.Readings + next.Readings, Moments.Sum(last.Milliseconds, next.Milliseconds));
    }

    private readonly record struct Run(long From, long To, int Readings, long Milliseconds);
}
