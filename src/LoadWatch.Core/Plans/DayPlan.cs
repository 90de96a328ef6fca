namespace LoadWatch.Plans;

/// <summary>What plan and answers say of one person's date.</summary>
/// <param name="Absence">Ill, injured or away, or null.</param>
/// <param name="ReturnDay">Counts the days since the return from a break of 7 or more days, from 1 to <see cref="PersonPlan.ReturnDays"/>; null outside.</param>
/// <param name="IsMatch">A match is planned or answered.</param>
/// <param name="RestStatedBy">Who stated rest: <c>plan</c>, <c>answers</c>, <c>days</c>; null where nobody did.</param>
/// <param name="Expected">Sessions of the date for which a recording is expected, count.</param>
/// <param name="Phases">Phases of the plan that hold on the date, in the order of <see cref="PlanWord"/>.</param>
public sealed record DayPlan(
    AbsenceWord? Absence, int? ReturnDay, bool IsMatch, string? RestStatedBy, int Expected, IReadOnlyList<PlanWord> Phases)
{
    /// <summary>Nothing is planned or said.</summary>
    public static DayPlan None { get; } = new(null, null, false, null, 0, []);

    public bool IsIn(PlanWord phase) => Phases.Count > 0 && Phases.Contains(phase);
}
