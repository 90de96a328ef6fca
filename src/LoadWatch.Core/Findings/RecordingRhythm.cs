// How far apart a person's recorded days usually are: a quantile of the gaps between them, by nearest rank upward
// (the value of rank ceil(q n) of n sorted values). Quantile, look-back, extra days and ceiling are a choice.
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>The rhythm of a person's recordings, as it stood on the last recorded day.</summary>
/// <param name="Gaps">Gaps that it rests on, count.</param>
/// <param name="UsualGapDays">The quantile of the gaps, days.</param>
/// <param name="LimitDays">More days than this without a recording are silence.</param>
internal sealed record RecordingRhythm(LocalDate LastRecorded, int Gaps, int UsualGapDays, int LimitDays)
{
    /// <summary>Null while there are too few gaps.</summary>
    /// <param name="recorded">Recorded dates, oldest first, at least one.</param>
    public static RecordingRhythm? Of(List<LocalDate> recorded, SilenceLimits limits)
    {
        var gaps = GapsBefore(recorded, limits.LookBackDays);
        if (gaps.Count < limits.GapsWanted)
        {
            return null;
        }

        gaps.Sort();
        var usual = gaps[(int)Math.Ceiling(Significant.Round(limits.GapQuantile * gaps.Count)) - 1];
        return new RecordingRhythm(recorded[^1], gaps.Count, usual, Math.Min(usual + limits.ExtraDays, limits.CeilingDays));
    }

    private static List<int> GapsBefore(List<LocalDate> recorded, int lookBackDays)
    {
        var gaps = new List<int>();
        var oldest = recorded[^1].PlusDays(-lookBackDays);
        for (var index = recorded.Count - 1; index > 0 && recorded[index - 1] >= oldest; index--)
        {
            gaps.Add(Period.DaysBetween(recorded[index - 1], recorded[index]));
        }

        return gaps;
    }
}
