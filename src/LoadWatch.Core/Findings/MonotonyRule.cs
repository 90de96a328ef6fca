// Monotony = mean / standard deviation of 7 daily loads, strain = load of the week x monotony (LoadSpread): Foster 1998, Med Sci Sports Exerc 30:1164-1168.
// That paper ties illnesses to thresholds found for each person, mostly of strain; a monotony of 2 as a limit is repeated everywhere but not confirmed in it: a
// convention. The quantile of the own strains stands for the person's own threshold; it, the usual week beside it and the return value are a choice.
using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// A heavy week without variation. Raised above the limit of monotony when the week is also above the usual and the strain above the quantile of the person's own
/// strains of the days before; over when monotony falls below the return value or the week is no heavier than the usual. One unknown day of the 7, or one whose load rests on a
/// faulty sensor, leaves it as it was (I-6); so do seven equal loads, which have no monotony.
/// </summary>
public sealed class MonotonyRule : IRule
{
    private const int WeekDays = 7;

    public string Name => "monotony";

    public RuleRecord Record { get; } = new MonotonyRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.Monotony;

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var (days, limits) = (subject.Days, subject.Limits.Monotony);
        var run = new FindingRun<EvenWeek>(limits.OnDays, limits.OffDays, subject.Memory.Before<RunState<EvenWeek>>(Name));
        var faults = new SensorFaults(subject);
        for (var index = subject.First; index < days.Count; index++)
        {
            run.Watch(PlanMutes.Of(Name, days[index].Plan), days[index].Date);
            if (!WeekIsMuted(faults, days[index].Date) && Read(days, index, limits) is { } week)
            {
                run.Read(week.Date, week, Raises(week, limits), Holds(week, limits));
            }

            subject.Memory.Keep(days[index].Date, Name, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(subject, days[index].Date, since, read, limits).Unless(run.Muted);
            }
        }
    }

    private static bool WeekIsMuted(SensorFaults faults, LocalDate date) => Enumerable.Range(0, WeekDays).Any(back => faults.MuteLoadOf(date.PlusDays(-back)));

    private static EvenWeek? Read(IReadOnlyList<Day> days, int index, MonotonyLimits limits) =>
        days[index] is { Monotony: { } monotony, Strain: { } strain, Acute: { } acute, ChronicBefore: { } usual } day
            ? new EvenWeek(day.Date, monotony, strain, acute, usual, monotony > limits.Raise ? OwnStrains.Before(days, index, limits) : null)
            : null;

    private static bool Raises(EvenWeek week, MonotonyLimits limits) =>
        week.Monotony > limits.Raise && week.Acute > week.Usual && week.Strain > week.Own?.Quantile;

    private static bool Holds(EvenWeek week, MonotonyLimits limits) =>
        week.Monotony >= Math.Min(limits.Return, limits.Raise) && week.Acute > week.Usual;

    private Finding Find(RuleSubject subject, LocalDate date, LocalDate since, EvenWeek read, MonotonyLimits limits) => new(
        subject.Person.Id,
        date,
        Name,
        Region: null,
        limits.Severity.Severity(),
        since,
        read.Monotony,
        limits.Raise,
        "ratio",
        Sentence(date, since, read, limits, subject.LoadUnit),
        Basis(read, limits, subject));

    private static string Sentence(LocalDate date, LocalDate since, EvenWeek read, MonotonyLimits limits, string unit)
    {
        var varies = read.Date == date ? "varies" : "varied";
        var numbers = $"monotony {Wording.Ratio(read.Monotony, limits.Raise)}, {Wording.Number(read.Acute)} against {Wording.Number(read.Usual)} {unit}";
        var limit = read.Monotony > limits.Raise
            ? $"the limit is {Wording.Limit(limits.Raise)}, passed since {Wording.Date(since, date)}"
            : $"it passed the limit of {Wording.Limit(limits.Raise)} on {Wording.Date(since, date)} and returns below {Wording.Limit(limits.Return)}";
        return $"Load of the last 7 days {varies} little at more than the usual week ({numbers}){Wording.NotKnownSince(read.Date, date)}; {limit}.";
    }

    private static Evidence Basis(EvenWeek read, MonotonyLimits limits, RuleSubject subject) => new(
        $"monotony = mean / standard deviation ({subject.Deviation.Divisor()}) of the last 7 days; strain = load of the last 7 days x monotony; the strain against a quantile of the person's "
            + "own strains before (nearest rank upward)",
        "Foster 1998, Med Sci Sports Exerc 30:1164-1168; the limit of monotony is a convention, the others a choice",
        [
            new("monotony", read.Monotony, "ratio", $"on {Wording.IsoDate(read.Date)}"),
            new("strain", read.Strain, subject.LoadUnit),
            new("acute", read.Acute, subject.LoadUnit, "load of the last 7 days"),
            new("chronic_before", read.Usual, subject.LoadUnit, "mean week of the 21 days before"),
            new("strain_of_own_quantile", read.Own?.Quantile, subject.LoadUnit),
            new("strains", read.Own?.Count, "days"),
            new("raise", limits.Raise, "ratio"),
            new("return", limits.Return, "ratio"),
            new("on_days", limits.OnDays, "days"),
            new("off_days", limits.OffDays, "days"),
            new("strain_quantile", limits.StrainQuantile, "share"),
            new("strains_wanted", limits.StrainsWanted, "days"),
            new("look_back", limits.LookBackDays, "days"),
        ]);

    /// <summary>What a date shows.</summary>
    private sealed record EvenWeek(LocalDate Date, double Monotony, double Strain, double Acute, double Usual, OwnStrains? Own);

    /// <summary>The person's strains before a date.</summary>
    private sealed record OwnStrains(int Count, double Quantile)
    {
        /// <summary>Null while there are too few.</summary>
        public static OwnStrains? Before(IReadOnlyList<Day> days, int index, MonotonyLimits limits)
        {
            var first = Math.Max(0, index - limits.LookBackDays);
            var strains = days.Skip(first).Take(index - first).Select(day => day.Strain).OfType<double>().Order().ToList();
            return strains.Count < limits.StrainsWanted
                ? null
                : new OwnStrains(strains.Count, strains[(int)Math.Ceiling(Significant.Round(limits.StrainQuantile * strains.Count)) - 1]);
        }
    }
}
