// Days without heavy or fast work of a body region, against limits by age. All limits are a choice; what counts as heavy or fast: HeavyOrFast.
using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Stimulus;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// Too long without heavy or fast work of a region that is watched, the legs unless the limits say otherwise. Only a heavy-or-fast day ends it. A day on which nothing is known, or a gap
/// that is known too sparsely, neither raises nor worsens nor clears it: the last known state stands (I-6). Off in absence and return: nobody is sent to heavy work
/// in the first days back.
/// </summary>
public sealed class StimulusGapRule : IRule
{
    public string Name => "stimulus_gap";

    public RuleRecord Record { get; } = new StimulusGapRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.StimulusGap;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) =>
        subject.Limits.StimulusGap.Regions.Distinct().Order().SelectMany(region => Evaluate(subject, region, subject.Limits.StimulusGap)).OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, BodyRegion region, StimulusGapLimits limits)
    {
        var key = $"{Name}/{BodyRegions.Word(region)}";
        var run = new FindingRun<Gap>(onDays: 1, offDays: 1, subject.Memory.Before<RunState<Gap>>(key));
        foreach (var day in subject.Judged)
        {
            run.Watch(PlanMutes.Of(Name, day.Plan), day.Date);
            if (Read(subject.Person, region, day, limits) is { } gap)
            {
                run.Read(day.Date, gap, gap.Days > 0 && gap.Days >= gap.Limit.NoticeDays, gap.Days > 0);
            }

            subject.Memory.Keep(day.Date, key, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(subject.Person, day.Date, region, since, read, limits).Unless(run.Muted);
            }
        }
    }

    /// <summary>The gap as the date shows it; null where too little is known. A heavy-or-fast day is always known.</summary>
    private static Gap? Read(Person person, BodyRegion region, Day day, StimulusGapLimits limits)
    {
        var known = day.Regions.GetValueOrDefault(region, RegionDay.NotCovered);
        if (known.HeavyOrFast is null || known.DaysSince is not { } gap || !limits.KnownEnough(known.KnownDaysSince, gap))
        {
            return null;
        }

        var age = person.AgeOn(day.Date);
        return new Gap(day.Date, known.HeavyOrFast is true ? 0 : gap, known, age, StimulusGapLimit.For(age, known, limits), known.Never);
    }

    private Finding Find(Person person, LocalDate date, BodyRegion region, LocalDate since, Gap gap, StimulusGapLimits limits)
    {
        var severity = gap.Limit.SeverityOf(gap.Days);
        var limit = gap.Limit.Of(severity);
        return new(person.Id, date, Name, region, severity, since, gap.Days, limit, "days", Sentence(date, region, gap), Basis(gap, limits));
    }

    private static string Sentence(LocalDate date, BodyRegion region, Gap gap)
    {
        var until = gap.Date == date ? "" : $" up to {Wording.Date(gap.Date, date)}, not known since";
        var first = Wording.Date(gap.Date.PlusDays(-gap.Days), date);
        var last = gap.Never ? $"none since it can be seen, from {first}" : $"last on {first}";
        return $"No heavy or fast {Wording.Work(region)} for {Wording.Days(gap.Days)}{until}{Remarks(gap)}; {last}.";
    }

    private static string Remarks(Gap gap)
    {
        var usual = gap.Region.UsualGapDays is { } days ? $"usual gap {Wording.Days(days)}" : null;
        var known = gap.Region.KnownDaysSince < gap.Days ? $"{gap.Region.KnownDaysSince} of them known" : null;
        var remarks = string.Join("; ", new[] { known, usual }.OfType<string>());
        return remarks.Length == 0 ? "" : $" ({remarks})";
    }

    private static Evidence Basis(Gap gap, StimulusGapLimits limits) => new(
        "days since the last heavy-or-fast day (3 hard bouts, or 6 hard repetitions in 2 sets; hard: relative drive of 0.70 or more), "
            + "against a limit by age",
        "a choice",
        [
            new("days_since", gap.Days, "days", $"on {Wording.IsoDate(gap.Date)}"),
            new("known_days_since", gap.Region.KnownDaysSince, "days"),
            new("heavy_or_fast_days_28", gap.Region.Days28, "days"),
            new("usual_gap", gap.Region.UsualGapDays, "days", "median over the last 365 days"),
            new("age", gap.Age, "years", gap.Age is null ? "unknown, taken as the younger" : null),
            new("notice", gap.Limit.NoticeDays, "days"),
            new("warning", gap.Limit.WarningDays, "days"),
            new("older_from", limits.OlderFrom, "years"),
            .. gap.Age >= limits.OlderFrom ? OfOlder(limits) : [],
            new("known_share_wanted", limits.CoveredShare, "share"),
        ]);

    /// <summary>What notice and warning of an older person come from, beside the usual gap.</summary>
    private static EvidenceItem[] OfOlder(StimulusGapLimits limits) =>
    [
        new("least_notice", limits.NoticeDays, "days"),
        new("older_usual_gap_factor", limits.OlderUsualGapFactor, "ratio", "notice at this multiple of the usual gap where that is later"),
        new("older_least_warning", limits.OlderWarningDays, "days"),
        new("older_warning_after_notice", limits.OlderWarningAfterNoticeDays, "days"),
    ];

    /// <summary>A region's gap as read on a date.</summary>
    private sealed record Gap(LocalDate Date, int Days, RegionDay Region, int? Age, StimulusGapLimit Limit, bool Never);
}
