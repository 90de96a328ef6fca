using LoadWatch.Findings;

namespace LoadWatch.Plans;

/// <summary>What plan and answers mean to the rules of load.</summary>
internal static class PlanPhases
{
    /// <summary>No day to learn the usual from. Camps stay in: their load was carried.</summary>
    public static bool IsSetAside(this DayPlan plan) => PlanMutes.HoldsAny(plan) || plan.IsIn(PlanWord.Travel);
}
