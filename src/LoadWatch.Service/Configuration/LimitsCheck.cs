using LoadWatch.Findings;

namespace LoadWatch.Service.Configuration;

/// <summary>Finds limits that contradict each other although each is in its range.</summary>
public static class LimitsCheck
{
    /// <summary>Pairs of path below the limits (<c>load_ratio.return</c>) and reason.</summary>
    public static IEnumerable<(string Path, string Reason)> Faults(RuleLimits limits)
    {
        if (limits.LoadRatio is { } ratio && ratio.Return > ratio.Raise)
        {
            yield return ("load_ratio.return", FormattableString.Invariant($"{ratio.Return} is above raise, which is {ratio.Raise}"));
        }

        if (limits.StimulusGap is { } gap && gap.WarningDays < gap.NoticeDays)
        {
            yield return ("stimulus_gap.warning_days", FormattableString.Invariant($"{gap.WarningDays} is below notice_days, which is {gap.NoticeDays}"));
        }

        if (limits.Silence is { } silence && silence.GapsWanted > silence.LookBackDays)
        {
            yield return ("silence.gaps_wanted", FormattableString.Invariant(
                $"{silence.GapsWanted} gaps never fit in look_back_days, which is {silence.LookBackDays}"));
        }
    }
}
