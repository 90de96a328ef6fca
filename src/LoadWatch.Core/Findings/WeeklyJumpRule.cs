// Rolling week against the last ordinary week: change = (A - B) / B, and A against the median M of ordinary weeks.
// A: load of the last 7 days, B: load of the newest week before them that is not skipped, M: median of the ordinary weeks (PastWeek), without a plan of those that are as
// full (FullWeek). Each is the load as if every session were known (TrainingWeek).
// That weekly changes are kept small is advice of Soligard et al. 2016, Br J Sports Med 50:1030-1041 (from memory; the evidence is weak). Every number is a choice;
// raise, return, the factors of the usual and the delays were fitted by simulation (tests/README.md).
// Departure from the plain change of a week: a light week, the off-season, travel, an absence, a return and a week without any load are stepped over, so that
// a usual week after one of them is no jump; a week of which too little is known is not.
using LoadWatch.Days;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// The last 7 days are far above the last ordinary week and above the usual. Raised when both hold on enough readable dates in a row, over when the change falls
/// below the return value. A date of unknown load, weeks of which too little is known, too few ordinary weeks: left as it was (I-6). Off in absences and after the return.
/// </summary>
public sealed class WeeklyJumpRule : IRule
{
    private const int WeekDays = 7;

    /// <summary>A plan that has expected nothing in this week and the weeks before it tells of no missing session. Weeks.</summary>
    internal const int PlanWeeks = 4;

    /// <summary>Fewest full weeks to compare with where there is no plan. A choice. Count.</summary>
    internal const int FullWeeksWanted = 4;

    public string Name => "weekly_jump";

    public RuleRecord Record { get; } = new WeeklyJumpRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.WeeklyJump;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) => WatchedSeries.Of(subject, subject.Limits.WeeklyJump.Quantities)
        .SelectMany(series => Evaluate(subject, series, subject.Limits.WeeklyJump))
        .OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, WatchedSeries series, WeeklyJumpLimits limits)
    {
        var key = series.KeyOf(this);
        var run = new FindingRun<Jump>(limits.OnDays, limits.OffDays, subject.Memory.Before<RunState<Jump>>(key));
        for (var index = subject.First; index < series.Days.Count; index++)
        {
            var day = series.Days[index];
            run.Watch(PlanMutes.Of(Name, day.Plan), day.Date);
            if (Read(series.Days, index, limits) is { } jump)
            {
                run.Read(day.Date, jump, Raises(jump, limits), jump.Change >= Math.Min(limits.Return, limits.Raise));
            }

            subject.Memory.Keep(day.Date, key, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(series, day.Date, since, read, limits).Unless(run.Muted);
            }
        }
    }

    private static Jump? Read(IReadOnlyList<Day> days, int index, WeeklyJumpLimits limits)
    {
        if (days[index].Load is null)
        {
            return null;
        }

        var week = TrainingWeek.Before(days, index, 1, limits.CoveredOf7).Single();
        var before = TrainingWeek.Before(days, index - WeekDays, limits.LookBackWeeks, limits.CoveredOf7).ToList();
        var weeks = before.ConvertAll(one => one.Past);
        return WeekChange.Of(week.Load, weeks) is { } change && Usual(week, before, limits) is { } usual
            ? new Jump(days[index].Date, change.Acute, change.BeforeUpTo, change.Before, usual.Load, change.Fraction, usual.Factor)
            {
                Known = week.Known,
                KnownBefore = before.Find(one => one.UpTo == change.BeforeUpTo).Known,
            }
            : null;
    }

    /// <summary>The usual week and the factor by which it must be exceeded; null where too few ordinary weeks are known.</summary>
    private static (double Load, double Factor)? Usual(TrainingWeek week, List<TrainingWeek> before, WeeklyJumpLimits limits)
    {
        var all = UsualWeek.Of(before.Select(one => one.Past), limits.Weeks, limits.Weeks);
        if (all is null || week.IsPlanned || before.Take(PlanWeeks).Any(one => one.IsPlanned))
        {
            return all is { } usual ? (usual.Load, limits.UsualFactor) : null;
        }

        var full = UsualWeek.Of(FullWeek.LikeOf(week, before, FullWeeksWanted), limits.Weeks, FullWeeksWanted);
        return full is { } like ? (like.Load, limits.UnplannedFactor) : null;
    }

    private static bool Raises(Jump jump, WeeklyJumpLimits limits) =>
        jump.Change >= limits.Raise && jump.Acute > Significant.Round(jump.Factor * jump.Usual);

    private Finding Find(WatchedSeries series, LocalDate date, LocalDate since, Jump read, WeeklyJumpLimits limits) => new(
        series.Person.Id,
        date,
        Name,
        Region: null,
        limits.Severity.Severity(),
        since,
        read.Change,
        limits.Raise,
        "fraction",
        Sentence(series, date, since, read, limits),
        Basis(read, limits, series.Unit))
    {
        Quantity = series.Quantity,
    };

    private static string Sentence(WatchedSeries series, LocalDate date, LocalDate since, Jump read, WeeklyJumpLimits limits)
    {
        var last = read.BeforeUpTo == read.Date.PlusDays(-WeekDays) ? "the week before" : $"the last ordinary week, up to {Wording.Date(read.BeforeUpTo, date)}";
        var week = $"{series.Heading} of the last 7 days{AsTold(read.Known, ",")} {Wording.Is(read.Date, date)} {Wording.Percent(read.Change, limits.Raise)} more";
        var numbers = $"{Wording.Number(read.Acute)}{OfIt(read.Known, ",")} against {Wording.Number(read.Before)} {series.Unit}{OfIt(read.KnownBefore)}, usually {Wording.Number(read.Usual)}";
        var what = $"{week} than {last}{AsTold(read.KnownBefore)} ({numbers})";
        return $"{what}{Wording.NotKnownSince(read.Date, date)}{Against(read, Wording.Date(since, date), limits)}.";
    }

    /// <summary><c>, as 3 of 5 sessions tell</c> for a week that was made whole; else nothing.</summary>
    private static string AsTold(KnownWeek? week, string end = "") => week switch
    {
        { IsScaledToSessions: true } known => $", as {known.Trained} of {known.Sessions} sessions tell{end}",
        { IsScaledToDays: true } known => $", as {known.Days} of {WeekDays} days tell{end}",
        _ => "",
    };

    /// <summary><c>, 372 of it known</c> for a week that was made whole; else nothing.</summary>
    private static string OfIt(KnownWeek? week, string end = "") =>
        week is { IsScaledToSessions: true } or { IsScaledToDays: true } ? $", {Wording.Number(week.Value.Sum)} of it known{end}" : "";

    private static string Against(Jump read, string since, WeeklyJumpLimits limits) => read.Change >= limits.Raise
        ? $"; the limit is {Wording.Percent(limits.Raise)}, passed since {since}"
        : $"; it passed the limit of {Wording.Percent(limits.Raise)} on {since} and returns below {Wording.Percent(limits.Return)}";

    private static Evidence Basis(Jump read, WeeklyJumpLimits limits, string unit) => new(
        "change = (load of the last 7 days - load of the last ordinary week) / the latter, and the last 7 days against the median of the ordinary weeks before; "
            + "a week with sessions missing is scaled to them: known load x sessions / known sessions, and where none is missing but days are unknown: known load x 7 / known days; "
            + "without a plan the usual is that of weeks with as many training days",
        "a choice",
        [
            new("change", read.Change, "fraction", $"on {Wording.IsoDate(read.Date)}"),
            new("acute", read.Acute, unit, $"load of the last 7 days{AsTold(read.Known)}"),
            .. Of(read.Known, "acute", unit),
            new("before", read.Before, unit, $"the week up to {Wording.IsoDate(read.BeforeUpTo)}{AsTold(read.KnownBefore)}"),
            .. Of(read.KnownBefore, "before", unit),
            new("usual", read.Usual, unit, "median of the ordinary weeks, each as if all its sessions were known"),
            new("raise", limits.Raise, "fraction"),
            new("return", limits.Return, "fraction"),
            new("usual_factor", read.Factor, "ratio"),
            new("weeks", limits.Weeks, "count"),
            new("look_back", limits.LookBackWeeks, "weeks"),
            new("covered_of_7_wanted", limits.CoveredOf7, "days"),
            new("on_days", limits.OnDays, "days"),
            new("off_days", limits.OffDays, "days"),
        ]);

    private static EvidenceItem[] Of(KnownWeek? week, string name, string unit) =>
    [
        new($"{name}_known", week?.Sum, unit, "of the known days"),
        new($"{name}_known_days", week?.Days, "days"),
        new($"{name}_known_sessions", week?.Trained, "count"),
        new($"{name}_sessions", week?.Sessions, "count", "with training, or expected by the plan"),
    ];

    /// <summary>What a date shows; loads in the series' unit.</summary>
    private sealed record Jump(LocalDate Date, double Acute, LocalDate BeforeUpTo, double Before, double Usual, double Change, double Factor)
    {
        /// <summary>What is known of the last 7 days; null where a former version read them.</summary>
        public KnownWeek? Known { get; init; }

        /// <summary>The same of the week before.</summary>
        public KnownWeek? KnownBefore { get; init; }
    }
}
