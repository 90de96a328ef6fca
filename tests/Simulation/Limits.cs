using LoadWatch.Findings;
using LoadWatch.Simulation.Worlds;

namespace LoadWatch.Simulation;

/// <summary>Limits under which the worlds are looked at.</summary>
public static class Limits
{
    /// <summary>As built in.</summary>
    public static RuleLimits BuiltIn(Habits habits) => OfClinic(new RuleLimits(), habits);

    /// <summary>Fitted to the healthy and to the episodes: as few false alerts as leave nine of ten episodes found.</summary>
    public static RuleLimits Fitted(Habits habits)
    {
        var limits = new RuleLimits();
        limits = limits with
        {
            LoadRatio = limits.LoadRatio with { Raise = 2.2, Return = 1.8, OnDays = 2 },
            WeeklyJump = limits.WeeklyJump with { Raise = 0.3, Return = 0.15, UsualFactor = 1.5 },
            SessionSpike = limits.SessionSpike with { LoadNotice = 0.6, RunNotice = 0.3, RunWarning = 0.6, SessionsWanted = 5 },
            FallingLoad = limits.FallingLoad with { Notice = 0.55, OnDays = 3 },
            StimulusLow = limits.StimulusLow with { UsualShare = 0.35, OlderFloorDays = 2 },
            Silence = limits.Silence with { PlannedMissed = 3, ExtraDays = 3 },
            NotUsable = limits.NotUsable with { Sessions = 3 },
        };
        return OfClinic(habits == Habits.Clinic ? limits with { LoadRatio = limits.LoadRatio with { Enabled = false }, WeeklyJump = limits.WeeklyJump with { Enabled = false } } : limits, habits);
    }

    /// <summary>The same limits without deadband and delays: over on the first date below the limit, raised and over at once.</summary>
    public static RuleLimits WithoutDeadband(RuleLimits limits) => limits with
    {
        LoadRatio = limits.LoadRatio with { Return = limits.LoadRatio.Raise, OnDays = 1, OffDays = 1 },
        WeeklyJump = limits.WeeklyJump with { Return = limits.WeeklyJump.Raise, OnDays = 1, OffDays = 1 },
        Monotony = limits.Monotony with { Return = limits.Monotony.Raise, OnDays = 1, OffDays = 1 },
        FallingLoad = limits.FallingLoad with { Return = limits.FallingLoad.Notice, OnDays = 1, OffDays = 1 },
        StimulusLow = limits.StimulusLow with { ReturnExtraDays = 0, OnDays = 1, OffDays = 1 },
        NotUsable = limits.NotUsable with { OnDays = 1, OffDays = 1 },
        SessionSpike = limits.SessionSpike with { HoldDays = 0 },
    };

    /// <summary>Even weeks and days in a row mean little where people come twice a week.</summary>
    private static RuleLimits OfClinic(RuleLimits limits, Habits habits) => habits == Habits.Clinic
        ? limits with { Monotony = limits.Monotony with { Enabled = false }, HardDays = limits.HardDays with { Enabled = false } }
        : limits;
}
