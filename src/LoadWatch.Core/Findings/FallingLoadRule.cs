// Mean week of the last 21 days against the median of the 8 weeks before: ratio = (7 x sum of 21 days / known days) / median week.
// Endurance was kept for up to 15 weeks when volume was cut by 33 to 66 % and intensity kept: Spiering, Mujika, Sharp and Foulis 2021, J Strength Cond Res
// 35:1449-1458. Below 34 % lies outside of what was shown; the return value is a choice; 55 % and the delay were fitted by simulation
// (tests/README.md).
// Departures: the group's load stands for volume, and intensity is not looked at here.
using System.Runtime.InteropServices;
using LoadWatch.Days;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// The usual load is fading. The days are the last ones that plan and answers do not set aside, within twice as many; a date of unknown load, too few known days
/// or too few ordinary weeks before them leave it as it was (I-6). Off in light weeks, the off-season, absences and after the return.
/// </summary>
public sealed class FallingLoadRule : IRule
{
    /// <summary>Days with known load wanted in each of the weeks before. A choice.</summary>
    internal const int KnownOf7 = 5;

    public string Name => "falling_load";

    public RuleRecord Record { get; } = new FallingLoadRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.FallingLoad;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) => WatchedSeries.Of(subject, subject.Limits.FallingLoad.Quantities)
        .SelectMany(series => Evaluate(subject, series, subject.Limits.FallingLoad))
        .OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, WatchedSeries series, FallingLoadLimits limits)
    {
        var key = series.KeyOf(this);
        var run = new FindingRun<Fall>(limits.OnDays, limits.OffDays, subject.Memory.Before<RunState<Fall>>(key));
        for (var index = subject.First; index < series.Days.Count; index++)
        {
            var day = series.Days[index];
            run.Watch(PlanMutes.Of(Name, day.Plan), day.Date);
            if (Read(series.Days, index, limits) is { } fall)
            {
                run.Read(day.Date, fall, fall.Ratio < limits.Notice, fall.Ratio < Math.Max(limits.Return, limits.Notice));
            }

            subject.Memory.Keep(day.Date, key, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(series, day.Date, since, read, limits).Unless(run.Muted);
            }
        }
    }

    private static Fall? Read(IReadOnlyList<Day> days, int index, FallingLoadLimits limits)
    {
        var (loads, oldest) = LastDays(days, index, limits.Days);
        var week = LoadWindow.Of(CollectionsMarshal.AsSpan(loads), 0, limits.Days).MeanWeek(limits.KnownWanted);
        if (days[index].Load is null || week is null)
        {
            return null;
        }

        return UsualWeek.Of(PastWeek.Before(days, oldest - 1, limits.Weeks, KnownOf7), limits.Weeks, limits.WeeksWanted) is { } usual
            ? new Fall(days[index].Date, week.Value, loads.Count(load => load.HasValue), usual.Load, usual.Weeks, Significant.Round(week.Value / usual.Load))
            : null;
    }

    /// <summary>Loads of the last days that are not set aside, newest first, and the index of the oldest.</summary>
    private static (List<double?> Loads, int Oldest) LastDays(IReadOnlyList<Day> days, int index, int wanted)
    {
        var (loads, oldest) = (new List<double?>(wanted), index);
        for (var at = index; at >= 0 && at > index - (2 * wanted) && loads.Count < wanted; at--)
        {
            if (!days[at].Plan.IsSetAside())
            {
                loads.Add(days[at].Load);
                oldest = at;
            }
        }

        return (loads, oldest);
    }

    private Finding Find(WatchedSeries series, LocalDate date, LocalDate since, Fall read, FallingLoadLimits limits)
    {
        var severity = read.Ratio < limits.Warning ? Severity.Warning : Severity.Notice;
        var limit = severity == Severity.Warning ? limits.Warning : limits.Notice;
        return new(
            series.Person.Id,
            date,
            Name,
            Region: null,
            severity,
            since,
            read.Ratio,
            limit,
            "ratio",
            Sentence(series, date, since, read, limit, limits),
            Basis(read, limits, series.Unit))
        {
            Quantity = series.Quantity,
        };
    }

    private static string Sentence(WatchedSeries series, LocalDate date, LocalDate since, Fall read, double limit, FallingLoadLimits limits)
    {
        var what = $"{series.Heading} of the last {limits.Days} days {Wording.Is(read.Date, date)} {Wording.Percent(read.Ratio, limit)} of the usual "
            + $"({Wording.Number(read.Week)} a week against {Wording.Number(read.Usual)} {series.Unit})";
        var against = read.Ratio < limit
            ? $", under the limit of {Wording.Percent(limit)}; low since {Wording.Date(since, date)}"
            : $"; it passed the limit of {Wording.Percent(limit)} on {Wording.Date(since, date)} and returns at {Wording.Percent(limits.Return)}";
        return $"{what}{Wording.NotKnownSince(read.Date, date)}{against}.";
    }

    private static Evidence Basis(Fall read, FallingLoadLimits limits, string unit) => new(
        "ratio = mean week of the last days that are not set aside, scaled to their known days / median of the ordinary weeks before them",
        "Spiering, Mujika, Sharp and Foulis 2021, J Strength Cond Res 35:1449-1458 for about a third; the other limits: a choice",
        [
            new("ratio", read.Ratio, "ratio", $"on {Wording.IsoDate(read.Date)}"),
            new("week", read.Week, unit, "mean week of those days"),
            new("known", read.Known, "days"),
            new("usual", read.Usual, unit, "median of the ordinary weeks before"),
            new("ordinary_weeks", read.Weeks, "count"),
            new("notice", limits.Notice, "ratio"),
            new("warning", limits.Warning, "ratio"),
            new("return", limits.Return, "ratio"),
            new("on_days", limits.OnDays, "days"),
            new("off_days", limits.OffDays, "days"),
            new("days", limits.Days, "days"),
            new("covered_share_wanted", limits.CoveredShare, "share"),
            new("weeks", limits.Weeks, "count"),
            new("weeks_wanted", limits.WeeksWanted, "count"),
        ]);

    /// <summary>What a date shows; loads in the series' unit.</summary>
    private sealed record Fall(LocalDate Date, double Week, int Known, double Usual, int Weeks, double Ratio);
}
