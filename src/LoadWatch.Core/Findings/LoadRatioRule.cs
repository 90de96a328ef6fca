// Acute load against the usual week, uncoupled: U = 7-day load / mean week of the 21 days before.
// Windt and Gabbett 2018, Br J Sports Med 53:988-990;
// the limit of 1.8 uncoupled is 1.5 coupled: C = 4 U / (U + 3). That a limit is watched at all, its value, coverage and return value are
// a choice: the ratio describes change and nothing else.
using LoadWatch.Days;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// The last 7 days are well above the usual week. Raised at the limit, holds until below the return value; history and chronic load are
/// asked for when it is raised, coverage always: a day covered too thinly leaves things as they were (I-6).
/// </summary>
public sealed class LoadRatioRule : IRule
{
    /// <summary>The unit of a training impulse.</summary>
    public const string ArbitraryUnits = "AU";

    public string Name => "load_ratio";

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var (person, days, limits) = subject;
        LocalDate? since = null;
        Day? read = null;
        foreach (var day in days)
        {
            if (IsKnown(day, limits.LoadRatio))
            {
                read = day;
                since = Since(since, day, limits.LoadRatio);
            }

            if (since is { } start && read is not null)
            {
                yield return Find(person, day.Date, start, read, limits.LoadRatio, subject.LoadUnit);
            }
        }
    }

    private static bool IsKnown(Day day, LoadRatioLimits limits) =>
        day.RatioUncoupled.HasValue && Known(day.Coverage7, 7) >= limits.CoveredOf7 && Known(day.Coverage28, 28) >= limits.CoveredOf28;

    private static double Known(double coverage, int days) => Math.Round(coverage * days);

    private static LocalDate? Since(LocalDate? since, Day day, LoadRatioLimits limits)
    {
        var holds = since is null ? Raises(day, limits) : day.RatioUncoupled >= Math.Min(limits.Return, limits.Raise);
        return holds ? since ?? day.Date : null;
    }

    private static bool Raises(Day day, LoadRatioLimits limits) =>
        day.RatioUncoupled >= limits.Raise
        && day.DaysSinceFirstCovered >= limits.HistoryDays
        && day.Chronic > Significant.Round(limits.ChronicShareOfMedian * day.ChronicMedian);

    private Finding Find(Person person, LocalDate date, LocalDate since, Day read, LoadRatioLimits limits, string loadUnit) => new(
        person.Id,
        date,
        Name,
        Region: null,
        Severity.Warning,
        since,
        read.RatioUncoupled!.Value,
        limits.Raise,
        "ratio",
        Sentence(date, since, read, limits, loadUnit),
        Basis(read, limits, loadUnit));

    private static string Sentence(LocalDate date, LocalDate since, Day read, LoadRatioLimits limits, string loadUnit)
    {
        var (ratio, held) = (read.RatioUncoupled!.Value, read.Date != date);
        var what = $"Load of the last 7 days {(held ? "was" : "is")} {Wording.Ratio(ratio, limits.Raise)} times the usual week "
            + $"({Wording.Number(read.Acute!.Value)} against {Wording.Number(read.ChronicBefore!.Value)} {loadUnit})";
        var when = held ? $" on {Wording.Date(read.Date, date)}, not known since" : "";
        return $"{what}{when}{Against(ratio, Wording.Date(since, date), limits)}.";
    }

    private static string Against(double ratio, string since, LoadRatioLimits limits) => ratio.CompareTo(limits.Raise) switch
    {
        > 0 => $", above the limit of {Wording.Limit(limits.Raise)} since {since}",
        0 => $", at the limit of {Wording.Limit(limits.Raise)} or above since {since}",
        _ => $"; it passed the limit of {Wording.Limit(limits.Raise)} on {since} and returns below {Wording.Limit(limits.Return)}",
    };

    private static Evidence Basis(Day read, LoadRatioLimits limits, string loadUnit) => new(
        "uncoupled ratio = load of the last 7 days / mean week of the 21 days before, both scaled to their known days",
        "Windt and Gabbett 2018, Br J Sports Med 53:988-990; limits: a choice",
        [
            new("ratio_uncoupled", read.RatioUncoupled, "ratio", $"on {Wording.IsoDate(read.Date)}"),
            new("acute", read.Acute, loadUnit, "load of the last 7 days"),
            new("chronic_before", read.ChronicBefore, loadUnit, "mean week of the 21 days before"),
            new("ratio_coupled", read.RatioCoupled, "ratio"),
            new("chronic", read.Chronic, loadUnit, "mean week of the last 28 days"),
            new("chronic_median", read.ChronicMedian, loadUnit, "median of chronic over the last 365 days"),
            new("coverage_7", read.Coverage7, "share"),
            new("coverage_28", read.Coverage28, "share"),
            new("days_since_first_covered", read.DaysSinceFirstCovered, "days"),
            new("raise", limits.Raise, "ratio"),
            new("return", limits.Return, "ratio"),
            new("history_wanted", limits.HistoryDays, "days"),
            new("covered_of_7_wanted", limits.CoveredOf7, "days"),
            new("covered_of_28_wanted", limits.CoveredOf28, "days"),
            new("chronic_share_of_median_wanted", limits.ChronicShareOfMedian, "share"),
        ]);
}
