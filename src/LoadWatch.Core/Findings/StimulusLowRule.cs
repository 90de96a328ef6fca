// Heavy-or-fast days of a body region among the last 14, against half of the person's usual number in 14 days (their number among the 56 days before,
// scaled to the known ones, over 4) and against a floor by age. All a choice; guidelines for older people ask for muscle strengthening on 2 or more days
// a week (WHO 2020, Bull et al., Br J Sports Med 54:1451-1462), which is where the floor of 3 in 14 days comes from: one visit missed is none.
using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// Too few heavy-or-fast days of a region, legs first. Off in the first weeks, in light weeks, off-season, absence and return, and not
/// raised while the gap since the last one is long enough for the rule of the gap: that one tells it then. Days covered too thinly leave things as they were (I-6).
/// </summary>
public sealed class StimulusLowRule : IRule
{
    private const int Window = 14;
    private const int UsualDays = 56;

    /// <summary>Readable dates in a row before it is raised: one visit a day late raises nothing. A choice.</summary>
    private const int OnDays = 3;

    private static readonly BodyRegion[] Regions = [BodyRegion.Legs];

    public string Name => "stimulus_low";

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.StimulusLow;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) =>
        Regions.SelectMany(region => Evaluate(subject, region)).OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, BodyRegion region)
    {
        var series = subject.Days.Select(day => day.Regions.GetValueOrDefault(region, RegionDay.NotCovered)).ToList();
        var first = series.FindIndex(day => day.DaysSince.HasValue);
        var key = $"{Name}/{BodyRegions.Word(region)}";
        var run = new FindingRun<Count>(OnDays, subject.Memory.Before<RunState<Count>>(key));
        for (var index = Math.Max(first, subject.First); first >= 0 && index < series.Count; index++)
        {
            var day = subject.Days[index];
            if (IsOff(day))
            {
                run.End();
            }
            else if (index - first >= subject.Limits.StimulusLow.HistoryDays && !(run.Since is null && TheGapTellsIt(subject, day, series[index])) && Read(subject, series, first, index) is { } count)
            {
                run.Read(day.Date, count, count.IsLow, count.IsLow);
            }

            subject.Memory.Keep(day.Date, key, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(subject, day, region, since, read);
            }
        }
    }

    private static bool IsOff(Day day) =>
        day.Plan.Absence is not null
        || day.Plan.ReturnDay is not null
        || day.Plan.IsIn(PlanWord.LightWeek)
        || day.Plan.IsIn(PlanWord.OffSeason);

    private static bool TheGapTellsIt(RuleSubject subject, Day day, RegionDay region) =>
        region.DaysSince >= StimulusGapLimit.For(subject.Person.AgeOn(day.Date), region, subject.Limits.StimulusGap).NoticeDays;

    private static Count? Read(RuleSubject subject, List<RegionDay> series, int first, int index)
    {
        var limits = subject.Limits.StimulusLow;
        var (heavy, known) = Heavy(series, index - Window + 1, index);
        if (known < Significant.Round(limits.CoveredShare * Window))
        {
            return null;
        }

        var (before, knownBefore) = Heavy(series, Math.Max(first, index - Window - UsualDays + 1), index - Window);
        var usual = knownBefore < Significant.Round(limits.CoveredShare * UsualDays) ? (double?)null : Significant.Round((double)before / knownBefore * Window);
        var age = subject.Person.AgeOn(subject.Days[index].Date);
        var floor = age >= limits.OlderFrom ? limits.OlderFloorDays : limits.FloorDays;
        return new Count(subject.Days[index].Date, heavy, known, usual, age, floor, Math.Max(floor, Significant.Round(limits.UsualShare * (usual ?? 0))));
    }

    private static (int Heavy, int Known) Heavy(List<RegionDay> series, int from, int to)
    {
        var (heavy, known) = (0, 0);
        for (var index = Math.Max(0, from); index <= to; index++)
        {
            heavy += series[index].HeavyOrFast is true ? 1 : 0;
            known += series[index].HeavyOrFast.HasValue ? 1 : 0;
        }

        return (heavy, known);
    }

    private Finding Find(RuleSubject subject, Day day, BodyRegion region, LocalDate since, Count count) => new(
        subject.Person.Id,
        day.Date,
        Name,
        region,
        Severity.Notice,
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
        return $"Heavy or fast {Wording.Work(region)} on {Wording.Days(count.Heavy)} of 14{until}; {usual}, the limit is {Wording.Number(count.Limit)}. "
            + $"So since {Wording.Date(since, date)}.";
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
            new("age", count.Age, "years", count.Age is null ? "unknown, taken as the younger" : null),
            new("history_wanted", limits.HistoryDays, "days"),
            new("known_share_wanted", limits.CoveredShare, "share"),
        ]);

    /// <summary>Heavy-or-fast days as read on a date.</summary>
    private sealed record Count(LocalDate Date, int Heavy, int Known, double? UsualDays, int? Age, int Floor, double Limit)
    {
        public bool IsLow => Heavy < Limit;
    }
}
