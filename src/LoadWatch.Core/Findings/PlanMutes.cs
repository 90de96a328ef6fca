using LoadWatch.Plans;

namespace LoadWatch.Findings;

/// <summary>A state that plan or answers tell, and that turns rules off while it lasts.</summary>
public enum PlannedState
{
    /// <summary>Ill, injured or away.</summary>
    Absent,

    /// <summary>In the days after a break, or in a planned return.</summary>
    Returning,
    LightWeek,
    OffSeason,
}

/// <summary>Which planned state turns which rule off. The rules and what is printed of them go by this one table. A choice.</summary>
public static class PlanMutes
{
    private static readonly PlannedState[] All = Enum.GetValues<PlannedState>();

    private static readonly PlannedState[] Away = [PlannedState.Absent, PlannedState.Returning];

    private static readonly Dictionary<string, PlannedState[]> Table = new(StringComparer.Ordinal)
    {
        ["load_ratio"] = Away,
        ["weekly_jump"] = Away,
        ["falling_load"] = [.. Away, PlannedState.LightWeek, PlannedState.OffSeason],
        ["stimulus_gap"] = Away,
        ["stimulus_low"] = [.. Away, PlannedState.LightWeek, PlannedState.OffSeason],
        ["falling_capacity"] = [.. Away, PlannedState.OffSeason],
        ["silence"] = [PlannedState.Absent],
        ["test_overdue"] = [PlannedState.Absent],
    };

    /// <summary>The states that turn a rule off; none for a rule that is always watched.</summary>
    public static IReadOnlyList<PlannedState> Of(string rule) => Table.GetValueOrDefault(rule) ?? [];

    /// <summary>The first of them that holds by a date's plan, or null where the rule is watched.</summary>
    public static PlannedState? Of(string rule, DayPlan plan)
    {
        foreach (var state in Of(rule))
        {
            if (Holds(state, plan))
            {
                return state;
            }
        }

        return null;
    }

    /// <summary>For sentences: <c>away</c>, <c>returning</c>; the reason of an absence is told to few, so it is not said here.</summary>
    public static string Word(PlannedState state) => state switch
    {
        PlannedState.Absent => "away",
        PlannedState.Returning => "returning",
        PlannedState.LightWeek => "light week",
        PlannedState.OffSeason => "off-season",
        _ => throw new ArgumentOutOfRangeException(nameof(state)),
    };

    /// <summary>Whether any planned state holds.</summary>
    internal static bool HoldsAny(DayPlan plan) => Array.Exists(All, state => Holds(state, plan));

    internal static bool Holds(PlannedState state, DayPlan plan) => state switch
    {
        PlannedState.Absent => plan.Absence is not null,
        PlannedState.Returning => plan.ReturnDay is not null || plan.IsIn(PlanWord.Returning),
        PlannedState.LightWeek => plan.IsIn(PlanWord.LightWeek),
        PlannedState.OffSeason => plan.IsIn(PlanWord.OffSeason),
        _ => throw new ArgumentOutOfRangeException(nameof(state)),
    };
}
