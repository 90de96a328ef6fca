// Heavy-or-fast days of a body region among the last 14, against a share of the person's usual number in 14 days (their number among the 56 days before,
// scaled to the known ones, over 4) and against a floor by age. All a choice; guidelines for older people ask for muscle strengthening on 2 or more days
// a week (WHO 2020, Bull et al., Br J Sports Med 54:1451-1462), of which the floor of 2 in 14 days is half: of people with two visits a week, one in seven
// missed, a floor of 3 told too often in simulation (tests/README.md).
using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// Too few heavy-or-fast days of a region that is watched, the legs unless the limits say otherwise. Off in the first weeks, in light weeks, off-season, absence and return, and not
/// raised while the gap since the last one is long enough for the rule of the gap: that one tells it then. Days covered too thinly leave things as they were (I-6).
/// </summary>
public sealed class StimulusLowRule : IRule
{
    public string Name => "stimulus_low";

    public RuleRecord Record { get; } = new StimulusLowRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.StimulusLow;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) =>
        subject.Limits.StimulusLow.Regions.Distinct().Order().SelectMany(region => Evaluate(subject, region)).OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, BodyRegion region)
    {
        var series = subject.Days.Select(day => day.Regions.GetValueOrDefault(region, RegionDay.NotCovered)).ToList();
        var first = series.FindIndex(day => day.DaysSince.HasValue);
        var tally = new HeavyTally();
        series.ForEach(day => tally.Add(day.HeavyOrFast));
        var key = $"{Name}/{BodyRegions.Word(region)}";
        var limits = subject.Limits.StimulusLow;
        var run = new FindingRun<Count>(limits.OnDays, limits.OffDays, subject.Memory.Before<RunState<Count>>(key));
        for (var index = Math.Max(first, subject.First); first >= 0 && index < series.Count; index++)
        {
            var day = subject.Days[index];
            run.Watch(PlanMutes.Of(Name, day.Plan), day.Date);
            if (index - first >= limits.HistoryDays && !(run.Since is null && TheGapTellsIt(subject, day, region, series[index])) && Read(subject, tally, index) is { } count)
            {
                run.Read(day.Date, count, count.Heavy < count.Limit, count.Heavy < count.Return);
            }

            subject.Memory.Keep(day.Date, key, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(subject, day, region, since, read).Unless(run.Muted);
            }
        }
    }

    private static bool TheGapTellsIt(RuleSubject subject, Day day, BodyRegion region, RegionDay seen) =>
        subject.Limits.StimulusGap is { Enabled: true } gap
        && gap.Regions.Contains(region)
        && seen.DaysSince >= StimulusGapLimit.For(subject.Person.AgeOn(day.Date), seen, gap).NoticeDays;

    private static Count? Read(RuleSubject subject, HeavyTally tally, int index)
    {
        var limits = subject.Limits.StimulusLow;
        var (heavy, known) = tally.Among(index, HeavyTally.WindowDays);
        if (known < Significant.Round(limits.CoveredShare * HeavyTally.WindowDays))
        {
            return null;
        }

        var usual = tally.Usual(index, limits.CoveredShare);
        var age = subject.Person.AgeOn(subject.Days[index].Date);
        var floor = age >= limits.OlderFrom ? limits.OlderFloorDays : limits.FloorDays;
        var limit = Math.Max(floor, Significant.Round(limits.UsualShare * (usual ?? 0)));
        var over = Math.Max(limit, Math.Min(limit + limits.ReturnExtraDays, usual ?? limit));
        return new Count(subject.Days[index].Date, heavy, known, usual, age, floor, limit, over);
    }

    private Finding Find(RuleSubject subject, Day day, BodyRegion region, LocalDate since, Count count) => new(
        subject.Person.Id,
        day.Date,
        Name,
        region,
        subject.Limits.StimulusLow.Severity.Severity(),
        since,
        count.Heavy,
        count.Limit,
        "days",
        Sentence(day.Date, region, since, count),
        Basis(count, subject.Limits.StimulusLow));

    private static string Sentence(LocalDate date, BodyRegion region, LocalDate since, Count count)
    {
        var usual = count.UsualDays is { } days ? $"usually {Wording.Number(days)}" : "their usual is not known yet";
        var until = count.Date == date ? "" : $" up to {Wording.Date(count.Date, date)}, not known since";
        return $"Heavy or fast {Wording.Work(region)} on {Wording.Days(count.Heavy)} of 14{until}; {usual}, the limit is {Wording.Number(count.Limit)}"
            + $"{(count.Heavy < count.Limit ? "" : $", over at {Wording.Number(Math.Ceiling(count.Return))}")}. So since {Wording.Date(since, date)}.";
    }

    private static Evidence Basis(Count count, StimulusLowLimits limits) => new(
        "heavy-or-fast days among the last 14, against the larger of a floor by age and a share of the usual number (that of the 56 days before, per 14 known days)",
        "a choice",
        [
            new("heavy_or_fast_days_14", count.Heavy, "days", $"on {Wording.IsoDate(count.Date)}"),
            new("known_days_14", count.Known, "days"),
            new("usual_14", count.UsualDays, "days"),
            new("usual_share", limits.UsualShare, "share"),
            new("floor", count.Floor, "days"),
            new("older_from", limits.OlderFrom, "years", "another floor"),
            new("return", count.Return, "days"),
            new("return_extra", limits.ReturnExtraDays, "days", "above the limit, as far as the usual reaches so high"),
            new("on_days", limits.OnDays, "days"),
            new("off_days", limits.OffDays, "days"),
            new("age", count.Age, "years", count.Age is null ? "unknown, taken as the younger" : null),
            new("history_wanted", limits.HistoryDays, "days"),
            new("known_share_wanted", limits.CoveredShare, "share"),
        ]);

    /// <summary>Heavy-or-fast days as read on a date.</summary>
    /// <param name="Return">So many end it: the limit and some, as far as the usual reaches so high.</param>
    private sealed record Count(LocalDate Date, int Heavy, int Known, double? UsualDays, int? Age, int Floor, double Limit, double Return);
}
