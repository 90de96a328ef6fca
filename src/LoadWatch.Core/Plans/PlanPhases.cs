
namespace LoadWatch.Plans;

/// <summary>What plan and answers mean to the rules of load.</summary>
internal static class PlanPhases
{
    /// <summary>Ill, injured or away, or in the days after the return: comparisons with the weeks just before say nothing.</summary>
    public static bool IsAwayOrReturning(this DayPlan plan) => plan.Absence is not null || plan.ReturnDay is not null || plan.IsIn(PlanWord.Returning);

    /// <summary>Little load is meant.</summary>
    public static bool IsLight(this DayPlan plan) => plan.IsIn(PlanWord.LightWeek) || plan.IsIn(PlanWord.OffSeason);

    /// <summary>No day to learn the usual from. Camps stay in: their load was carried.</summary>
    public static bool IsSetAside(this DayPlan plan) => plan.IsAwayOrReturning() || plan.IsLight() || plan.IsIn(PlanWord.Travel);
}
