// Hard days in a row, and matches close together. A day is hard when its load exceeds the factor x median of the recorded training days of the 8 weeks before it.
// That crowded calendars deserve attention: Soligard et al. 2016, Br J Sports Med 50:1030-1041. Every number is a choice.
using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// Too many hard days in a row, or too many matches in a few days. A row that is long enough ends with
/// days that are known to be clearly easier; a day of unknown load, or one
/// with too few training days before it, neither counts nor ends it (I-6). A match counts by plan or answers unless the person was absent or the day is known as
/// rest; matches are read on known dates only.
/// </summary>
public sealed class HardDaysRule : IRule
{
    public string Name => "hard_days";

    public RuleRecord Record { get; } = new HardDaysRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.HardDays;

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var limits = subject.Limits.HardDays;
        var before = subject.Memory.Before<Standing>(Name);
        var rows = new HardRows(limits, before?.Rows, before?.Row);
        var matches = new MatchDensity(limits, before?.Matches);
        var faults = new SensorFaults(subject);
        var since = before?.Since;
        foreach (var day in subject.Days.Take(subject.First))
        {
            rows.Learn(day);
            matches.Learn(day);
        }

        foreach (var day in subject.Judged)
        {
            rows.Pass(day, faults.MuteLoadOf(day.Date));
            matches.Pass(day);
            since = rows.Standing is null && matches.Standing is null ? null : since ?? day.Date;
            subject.Memory.Keep(day.Date, Name, rows.Row is null && rows.State is null && matches.State is null ? null : new Standing(since, rows.State, rows.Row, matches.State));
            if (since is { } start)
            {
                yield return rows.Standing is { } row ? OfRow(subject, day.Date, start, row) : OfMatches(subject, day.Date, start, matches.Standing!);
            }
        }
    }

    private Finding OfRow(RuleSubject subject, LocalDate date, LocalDate since, HardRow row)
    {
        var limits = subject.Limits.HardDays;
        var between = row.UnknownDays == 0 ? "" : $", {Wording.Days(row.UnknownDays)} of unknown load between them not counted";
        var text = $"{Wording.Days(row.Days)} in a row up to {Wording.Date(row.UpTo, date)} above {Wording.Limit(limits.MedianFactor)} times the usual training day "
            + $"({Wording.Number(row.Load)} on the last against {Wording.Number(row.Median)} {subject.LoadUnit}{between}); the limit is {limits.Days}.";
        return Found(subject, date, since, row.Days, limits.Days, "days", text, new(
            "days in a row with load > factor x median of the recorded training days before each",
            "a choice",
            [
                new("hard_days", row.Days, "days", $"up to {Wording.IsoDate(row.UpTo)}"),
                new("unknown_days_between", row.UnknownDays, "days"),
                new("load", row.Load, subject.LoadUnit, "of the last of them"),
                new("median_training_day", row.Median, subject.LoadUnit),
                new("training_days", row.TrainingDays, "days", "that the median rests on"),
                new("median_factor", limits.MedianFactor, "ratio"),
                new("return_factor", limits.ReturnFactor, "ratio"),
                new("days", limits.Days, "days"),
                new("on_days", limits.OnDays, "days"),
                new("off_days", limits.OffDays, "days"),
                new("look_back", limits.LookBackDays, "days"),
                new("training_days_wanted", limits.TrainingDaysWanted, "days"),
            ]));
    }

    private Finding OfMatches(RuleSubject subject, LocalDate date, LocalDate since, MatchCount count)
    {
        var limits = subject.Limits.HardDays;
        var text = $"{count.Matches} matches within {limits.MatchDays} days, the last on {Wording.Date(count.LastMatch, date)}; the limit is {limits.Matches}.";
        return Found(subject, date, since, count.Matches, limits.Matches, "matches", text, new(
            "dates with a match by plan or answers within the days up to the date",
            "a choice",
            [
                new("matches", count.Matches, "count", $"up to {Wording.IsoDate(count.Date)}"),
                new("matches_limit", limits.Matches, "count"),
                new("matches_return", limits.MatchesReturn, "count"),
                new("on_days", limits.OnDays, "days"),
                new("off_days", limits.OffDays, "days"),
                new("match_days", limits.MatchDays, "days"),
            ]));
    }

    private Finding Found(RuleSubject subject, LocalDate date, LocalDate since, double value, double limit, string unit, string text, Evidence evidence) =>
        new(subject.Person.Id, date, Name, Region: null, subject.Limits.HardDays.Severity.Severity(), since, value, limit, unit, text, evidence);

    /// <summary>What was carried of a day with the row that had not ended, and nothing that stands: as if the limit had not been passed yet.</summary>
    internal Carried RowAlone(Carried carried) => carried.Run<Standing>(Name) is { Row: { } row }
        ? new Carried { Runs = new Dictionary<string, object> { [Name] = new Standing(null, null, row, null) } }
        : Carried.Nothing;

    private sealed record Standing(LocalDate? Since, RunState<HardRow>? Rows, HardRow? Row, RunState<MatchCount>? Matches) : IStanding;
}
