// Acute load against the usual week, uncoupled: U = 7-day load / mean week of the 21 days before.
// Windt and Gabbett 2018, Br J Sports Med 53:988-990;
// the limit of 2.2 uncoupled is 1.69 coupled: C = 4 U / (U + 3). That a limit is watched at all and its coverage are a choice; its value, return value and
// delay were fitted by simulation (tests/README.md): the ratio describes change and nothing else.
using LoadWatch.Days;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// The last 7 days are well above the usual week. Raised at the limit, holds until below the return value; history and chronic load are
/// asked for when it is raised, coverage always: a date of unknown load, or covered too thinly, leaves things as they were (I-6). Off in absences and after the
/// return.
/// </summary>
public sealed class LoadRatioRule : IRule
{
    /// <summary>The unit of a training impulse.</summary>
    public const string ArbitraryUnits = "AU";

    public string Name => "load_ratio";

    public RuleRecord Record { get; } = new LoadRatioRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.LoadRatio;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) => WatchedSeries.Of(subject, subject.Limits.LoadRatio.Quantities)
        .SelectMany(series => Evaluate(subject, series, subject.Limits.LoadRatio))
        .OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, WatchedSeries series, LoadRatioLimits limits)
    {
        var key = series.KeyOf(this);
        var run = new FindingRun<Ratio>(limits.OnDays, limits.OffDays, subject.Memory.Before<RunState<Ratio>>(key));
        foreach (var day in series.Days.Skip(subject.First))
        {
            run.Watch(PlanMutes.Of(Name, day.Plan), day.Date);
            if (IsKnown(day, limits))
            {
                run.Read(day.Date, Ratio.Of(day), Raises(day, limits), day.RatioUncoupled >= Math.Min(limits.Return, limits.Raise));
            }

            subject.Memory.Keep(day.Date, key, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(series, day.Date, since, read, limits).Unless(run.Muted);
            }
        }
    }

    private static bool IsKnown(Day day, LoadRatioLimits limits) =>
        day is { Load: not null, RatioUncoupled: not null } && Known(day.Coverage7, 7) >= limits.CoveredOf7 && Known(day.Coverage28, 28) >= limits.CoveredOf28;

    private static double Known(double coverage, int days) => Math.Round(coverage * days);

    private static bool Raises(Day day, LoadRatioLimits limits) =>
        day.RatioUncoupled >= limits.Raise
        && day.DaysSinceFirstCovered >= limits.HistoryDays
        && day.Chronic > Significant.Round(limits.ChronicShareOfMedian * day.ChronicMedian)
        && !(day.Acute <= Significant.Round(limits.UsualFactor * day.UsualWeek));

    private Finding Find(WatchedSeries series, LocalDate date, LocalDate since, Ratio read, LoadRatioLimits limits) => new(
        series.Person.Id,
        date,
        Name,
        Region: null,
        limits.Severity.Severity(),
        since,
        read.RatioUncoupled,
        limits.Raise,
        "ratio",
        Sentence(series, date, since, read, limits),
        Basis(read, limits, series.Unit))
    {
        Quantity = series.Quantity,
    };

    private static string Sentence(WatchedSeries series, LocalDate date, LocalDate since, Ratio read, LoadRatioLimits limits)
    {
        var ratio = read.RatioUncoupled;
        var what = $"{series.Heading} of the last 7 days {Wording.Is(read.Date, date)} {Wording.Ratio(ratio, limits.Raise)} times the usual week "
            + $"({Wording.Number(read.Acute)} against {Wording.Number(read.ChronicBefore)} {series.Unit})";
        return $"{what}{Wording.NotKnownSince(read.Date, date)}{Against(ratio, Wording.Date(since, date), limits)}.";
    }

    private static string Against(double ratio, string since, LoadRatioLimits limits) => ratio.CompareTo(limits.Raise) switch
    {
        > 0 => $", above the limit of {Wording.Limit(limits.Raise)} since {since}",
        0 => $", at the limit of {Wording.Limit(limits.Raise)} or above since {since}",
        _ => $"; it passed the limit of {Wording.Limit(limits.Raise)} on {since} and returns below {Wording.Limit(limits.Return)}",
    };

    private static Evidence Basis(Ratio read, LoadRatioLimits limits, string loadUnit) => new(
        "uncoupled ratio = load of the last 7 days / mean week of the 21 days before, both scaled to their known days; raised where the mean week of the last 28 days also exceeds a "
            + "share of its own median, and the last 7 days a multiple of the usual week (median of ordinary weeks), where one is known",
        "Windt and Gabbett 2018, Br J Sports Med 53:988-990; limits: a choice",
        [
            new("ratio_uncoupled", read.RatioUncoupled, "ratio", $"on {Wording.IsoDate(read.Date)}"),
            new("acute", read.Acute, loadUnit, "load of the last 7 days"),
            new("chronic_before", read.ChronicBefore, loadUnit, "mean week of the 21 days before"),
            new("ratio_coupled", read.RatioCoupled, "ratio"),
            new("chronic", read.Chronic, loadUnit, "mean week of the last 28 days"),
            new("chronic_median", read.ChronicMedian, loadUnit, "median of chronic over the last 365 days"),
            new("usual_week", read.UsualWeek, loadUnit, "median of the ordinary weeks before"),
            new("coverage_7", read.Coverage7, "share"),
            new("coverage_28", read.Coverage28, "share"),
            new("days_since_first_covered", read.DaysSinceFirstCovered, "days"),
            new("raise", limits.Raise, "ratio"),
            new("return", limits.Return, "ratio"),
            new("on_days", limits.OnDays, "days"),
            new("off_days", limits.OffDays, "days"),
            new("history_wanted", limits.HistoryDays, "days"),
            new("covered_of_7_wanted", limits.CoveredOf7, "days"),
            new("covered_of_28_wanted", limits.CoveredOf28, "days"),
            new("chronic_share_of_median_wanted", limits.ChronicShareOfMedian, "share"),
            new("usual_factor_wanted", limits.UsualFactor, "ratio"),
        ]);

    /// <summary>What a date shows; loads in the series' unit.</summary>
    private sealed record Ratio(
        LocalDate Date,
        double RatioUncoupled,
        double Acute,
        double ChronicBefore,
        double? RatioCoupled,
        double? Chronic,
        double? ChronicMedian,
        double Coverage7,
        double Coverage28,
        int? DaysSinceFirstCovered)
    {
        /// <summary>Null where too few ordinary weeks are known, and where a former version read it.</summary>
        public double? UsualWeek { get; init; }

        public static Ratio Of(Day day) => new(
            day.Date,
            day.RatioUncoupled!.Value,
            day.Acute!.Value,
            day.ChronicBefore!.Value,
            day.RatioCoupled,
            day.Chronic,
            day.ChronicMedian,
            day.Coverage7,
            day.Coverage28,
            day.DaysSinceFirstCovered)
        {
            UsualWeek = day.UsualWeek,
        };
    }
}
