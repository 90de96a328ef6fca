// Best of the last 8 weeks against the best of the 8 weeks before, down by more than the error of the figure. Windows and errors of speed and power are a
// choice; the error of a one-repetition maximum estimated from repetitions is about 10 to 14 % (10.6 to 13.5 % of the mean in a direct test of equations).
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// A best has gone down: top speed, top power, the estimated maximum of an exercise; or what bests of several durations tell, critical power and critical speed
/// (<see cref="CriticalFalls"/>). Off in the off-season, in absence and return. It compares what was shown,
/// not what could be: whoever has not tried shows less. Read on recorded days only: time alone neither raises nor ends it (I-6).
/// </summary>
public sealed class FallingCapacityRule : IRule
{
    public const string Word = "falling_capacity";

    public string Name => Word;

    public RuleRecord Record { get; } = new FallingCapacityRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.FallingCapacity;

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var limits = subject.Limits.FallingCapacity;
        var faults = new SensorFaults(subject);
        var shown = subject.Activities.SelectMany(activity => ShownBy(activity, limits, faults)).ToLookup(one => one.Quantity.Name, StringComparer.Ordinal);
        return shown.Select(one => one.Key)
            .Concat(subject.Memory.KeysBefore.Where(key => key.StartsWith(KeyOf(""), StringComparison.Ordinal)).Select(key => key[KeyOf("").Length..]))
            .Where(quantity => CriticalQuantity.Of(quantity) is null)
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal)
            .SelectMany(quantity => Evaluate(subject, quantity, [.. shown[quantity].OrderBy(one => one.Date)], Percent(quantity, limits)!.Value))
            .Concat(CriticalQuantity.All.SelectMany(quantity => new CriticalFalls(subject, quantity, Name, KeyOf(quantity.Name)).Evaluate()));
    }

    private string KeyOf(string quantity) => $"{Name}/{quantity}";

    /// <summary>A walk shows no top speed, and a sensor that fails or writes nought shows nothing.</summary>
    private static IEnumerable<Shown> ShownBy(JoinedActivity activity, FallingCapacityLimits limits, SensorFaults faults) => activity.Quantities
        .Where(quantity => Percent(quantity.Name, limits) is not null && quantity.Value > 0)
        .Where(quantity => !faults.Mutes(activity, quantity.Name))
        .Where(quantity => quantity.Name != QuantityNames.SpeedTop || activity.Sport.Name is not ("walking" or "hiking"))
        .Select(quantity => new Shown(activity.Date, activity.Sport.IsTeamSport ? "team" : activity.Sport.Name, quantity));

    /// <summary>The sport with the most sessions of both stretches: a best on the bicycle says nothing of one on the ergometer.</summary>
    private static List<Shown> OfOneSport(List<Shown> shown) => shown
        .GroupBy(one => one.Sport, StringComparer.Ordinal)
        .OrderByDescending(sport => sport.Count())
        .ThenBy(sport => sport.Key, StringComparer.Ordinal)
        .FirstOrDefault()?.ToList() ?? [];

    private static double? Percent(string quantity, FallingCapacityLimits limits) => quantity switch
    {
        QuantityNames.SpeedTop => limits.SpeedPercent,
        QuantityNames.PowerTop => limits.PowerPercent,
        _ when quantity.StartsWith(QuantityNames.OneRepetitionMaxOf, StringComparison.Ordinal) => limits.OneRepetitionMaxPercent,
        _ => null,
    };

    private IEnumerable<Finding> Evaluate(RuleSubject subject, string quantity, List<Shown> shown, double percent)
    {
        var limits = subject.Limits.FallingCapacity;
        var run = new FindingRun<Bests>(limits.OnDays, limits.OffDays, subject.Memory.Before<RunState<Bests>>(KeyOf(quantity)));
        foreach (var day in subject.Judged)
        {
            var muted = PlanMutes.Of(Name, day.Plan);
            if (run.State is not null || (muted is not null && IsShownLately(shown, day.Date, limits)))
            {
                run.Watch(muted, day.Date);
            }

            if (day.State == DayState.Recorded && Read(shown, day.Date, limits) is { } read)
            {
                run.Read(day.Date, read, read.FallPercent > percent, read.FallPercent > Significant.Round(limits.ReturnShare * percent));
            }

            subject.Memory.Keep(day.Date, KeyOf(quantity), run.State);
            if (run is { Since: { } start, Reading: { } bests })
            {
                yield return Find(subject.Person, day.Date, quantity, start, bests, percent, limits).Unless(run.Muted);
            }
        }
    }

    /// <summary>Of what has not been shown yet, or long ago, nothing is kept: what is kept of a date hangs on nothing dated later.</summary>
    private static bool IsShownLately(List<Shown> shown, LocalDate date, FallingCapacityLimits limits) =>
        shown.Exists(one => one.Date <= date && one.Date > date.PlusDays(-2 * limits.Days));

    private static Bests? Read(List<Shown> shown, LocalDate date, FallingCapacityLimits limits)
    {
        var (middle, first) = (date.PlusDays(-limits.Days), date.PlusDays(-2 * limits.Days));
        var both = OfOneSport(shown.FindAll(one => one.Date > first && one.Date <= date));
        var late = both.FindAll(one => one.Date > middle);
        var early = both.FindAll(one => one.Date <= middle);
        return late.Count < limits.SessionsWanted || early.Count < limits.SessionsWanted
            ? null
            : new Bests(late.MaxBy(one => one.Quantity.Value)!, early.MaxBy(one => one.Quantity.Value)!, late.Count, early.Count);
    }

    private Finding Find(Person person, LocalDate date, string quantity, LocalDate since, Bests bests, double percent, FallingCapacityLimits limits) => new(
        person.Id,
        date,
        Name,
        Region: null,
        limits.Severity.Severity(),
        since,
        bests.FallPercent,
        percent,
        "percent",
        $"{Words(quantity)}: best of the last {limits.Days / 7} weeks {Value(bests.Late)} (on {Wording.Date(bests.Late.Date, date)}), "
            + $"{Wording.Number(bests.FallPercent)} % below the {Value(bests.Early)} of the weeks before (on {Wording.Date(bests.Early.Date, date)}).",
        Basis(bests, percent, limits))
    {
        Quantity = quantity,
    };

    private static string Words(string quantity) => quantity switch
    {
        QuantityNames.SpeedTop => "Top speed",
        QuantityNames.PowerTop => "Top power",
        _ => $"Estimated maximum of {quantity[QuantityNames.OneRepetitionMaxOf.Length..].Replace('_', ' ')}",
    };

    private static string Value(Shown shown) => $"{Wording.Number(shown.Quantity.Value)} {shown.Quantity.Unit}";

    private static Evidence Basis(Bests bests, double percent, FallingCapacityLimits limits) => new(
        "fall = (best of the stretch before - best of the last stretch) / best of the stretch before; raised above the error of the figure",
        "stretches and errors of speed and power: a choice; error of an estimated maximum: 10.6 to 13.5 % of the mean in direct tests",
        [
            new("best", bests.Late.Quantity.Value, bests.Late.Quantity.Unit, $"on {Wording.IsoDate(bests.Late.Date)}, of {bests.LateSessions} sessions"),
            new("best_before", bests.Early.Quantity.Value, bests.Early.Quantity.Unit, $"on {Wording.IsoDate(bests.Early.Date)}, of {bests.EarlySessions} sessions"),
            new("fall", bests.FallPercent, "percent"),
            new("error", percent, "percent"),
            new("return_share", limits.ReturnShare, "share"),
            new("on_days", limits.OnDays, "days"),
            new("off_days", limits.OffDays, "days"),
            new("stretch", limits.Days, "days"),
            new("sessions_wanted", limits.SessionsWanted, "count"),
        ]);

    private sealed record Shown(LocalDate Date, string Sport, Quantity Quantity);

    private sealed record Bests(Shown Late, Shown Early, int LateSessions, int EarlySessions)
    {
        public double FallPercent => Significant.Round((1 - (Late.Quantity.Value / Early.Quantity.Value)) * 100);
    }
}
