using LoadWatch.Days;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// Of the rule <c>falling_capacity</c>: critical power, or speed, of the last stretch is below that of the stretch before by more than a percentage and by more than a number of
/// combined standard errors, and the bests behind it look as hard-won (<see cref="CriticalFall"/>); what does not is unknown, not a fall.
/// </summary>
internal sealed class CriticalFalls(RuleSubject subject, CriticalQuantity quantity, string rule, string key)
{
    private readonly FallingCapacityLimits limits = subject.Limits.FallingCapacity;

    public IEnumerable<Finding> Evaluate()
    {
        var before = subject.Memory.Before<RunState<CriticalFall>>(key);
        var stretches = new CriticalStretches(subject, quantity);
        if (before is null && stretches.AreEmpty)
        {
            yield break;
        }

        var run = new FindingRun<CriticalFall>(limits.OnDays, limits.OffDays, before);
        foreach (var day in subject.Judged)
        {
            var muted = PlanMutes.Of(rule, day.Plan);
            if (run.State is not null || (muted is not null && stretches.AreShownOn(day.Date)))
            {
                run.Watch(muted, day.Date);
            }

            if (day.State == DayState.Recorded && stretches.On(day.Date) is { Fall: { } fall } reading && reading.Untold(quantity, limits) is null)
            {
                run.Read(day.Date, fall, fall.Raises(limits), fall.Holds(limits));
            }

            subject.Memory.Keep(day.Date, key, run.State);
            if (run is { Since: { } since, Reading: { } stands })
            {
                yield return Find(subject.Person, day.Date, since, stands).Unless(run.Muted);
            }
        }
    }

    private Finding Find(Person person, LocalDate date, LocalDate since, CriticalFall fall) => new(
        person.Id,
        date,
        rule,
        Region: null,
        limits.Severity.Severity(),
        since,
        fall.Percent,
        fall.LimitPercent(limits),
        "percent",
        $"{Wording.Capital(quantity.Words)} ({fall.Sport.Replace('_', ' ')}) by the bests of the last {limits.Days / 7} weeks {Value(fall.Late)}, "
            + $"{Wording.Number(fall.Percent)} % below the {Value(fall.Early)} of the weeks before{(fall.Late.Last == date ? "" : $"; read on {Wording.Date(fall.Late.Last, date)}")}.",
        Basis(fall))
    {
        Quantity = quantity.Name,
    };

    /// <summary><c>231 W (standard error 5 W)</c>.</summary>
    private string Value(CriticalStretch stretch) => $"{quantity.Value(stretch.Critical)} (standard error {quantity.Error(stretch.CriticalError)})";

    private Evidence Basis(CriticalFall fall) => new(
        $"{quantity.Line}, through the bests that may have been all out; fall = (value of the stretch before - value of the last stretch) / value of the stretch before; "
            + "raised above critical_percent and above critical_errors x sqrt(error^2 + error before^2)",
        "Monod and Scherrer 1965, The work capacity of a synergic muscular group, Ergonomics 8:329-338; Moritani et al. 1981, Ergonomics 24:339-350; limits and what counts as hard-won: a choice",
        [
            .. Of(fall.Late, ""),
            .. Of(fall.Early, "_before"),
            new("fall", fall.Percent, "percent"),
            new("combined_error", fall.CombinedError, quantity.Unit),
            new("heart_rate_below", fall.HeartRateBelowBpm, "bpm", "in the bests, against those before at the same durations; below 0: above"),
            new("critical_percent", limits.CriticalPercent, "percent"),
            new("critical_errors", limits.CriticalErrors, "standard errors"),
            new("return_share", limits.ReturnShare, "share"),
            new("on_days", limits.OnDays, "days"),
            new("off_days", limits.OffDays, "days"),
            new("stretch", limits.Days, "days"),
        ]);

    private IEnumerable<EvidenceItem> Of(CriticalStretch stretch, string suffix)
    {
        var note = $"{stretch.Trials} bests of {stretch.Span} from {stretch.Sessions} sessions, {Wording.IsoDate(stretch.First)} to {Wording.IsoDate(stretch.Last)}";
        yield return new($"{quantity.Name}{suffix}", stretch.Critical, quantity.Unit, note);
        yield return new($"{quantity.Name}_error{suffix}", stretch.CriticalError, quantity.Unit, "standard error, at least 2 % of the value");
        yield return new($"{quantity.ReserveName}{suffix}", stretch.Reserve, quantity.ReserveUnit);
        yield return new($"{quantity.ReserveName}_error{suffix}", stretch.ReserveError, quantity.ReserveUnit, "standard error, at least 10 % of the value");
    }
}
