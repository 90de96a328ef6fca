using LoadWatch.Days;

namespace LoadWatch.Findings;

/// <summary>The limits of a stimulus gap for one person on one date. Ages and days are a choice.</summary>
/// <param name="NoticeDays">Days without heavy or fast work that raise a notice.</param>
/// <param name="WarningDays">Days that make it a warning.</param>
internal readonly record struct StimulusGapLimit(double NoticeDays, double WarningDays)
{
    /// <param name="age">Years; an unknown age counts as under <see cref="StimulusGapLimits.OlderFrom"/>.</param>
    public static StimulusGapLimit For(int? age, RegionDay region, StimulusGapLimits limits)
    {
        if (age is null || age < limits.OlderFrom)
        {
            return new StimulusGapLimit(limits.NoticeDays, limits.WarningDays);
        }

        var notice = Math.Max(limits.NoticeDays, Significant.Round(limits.OlderUsualGapFactor * (region.UsualGapDays ?? 0)));
        return new StimulusGapLimit(notice, Math.Max(limits.OlderWarningDays, notice + limits.OlderWarningAfterNoticeDays));
    }

    public Severity SeverityOf(int days) => days >= WarningDays ? Severity.Warning : Severity.Notice;

    public double Of(Severity severity) => severity == Severity.Warning ? WarningDays : NoticeDays;
}
