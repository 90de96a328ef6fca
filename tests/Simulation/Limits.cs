using LoadWatch.Findings;
using LoadWatch.Simulation.Worlds;

namespace LoadWatch.Simulation;

/// <summary>Limits under which the worlds are looked at.</summary>
public static class Limits
{
    /// <summary>Fitted to the healthy and to the episodes: as few false alerts as leave nine of ten episodes found.</summary>
    public static RuleLimits BuiltIn(Habits habits) => habits == Habits.Clinic ? RuleLimits.OfClinic() : new RuleLimits();

    /// <summary>The built-in ones before that: every number a choice made without it.</summary>
    public static RuleLimits Before(Habits habits)
    {
        var limits = new RuleLimits();
        return OfClinicBefore(habits, limits with
        {
            LoadRatio = limits.LoadRatio with { Raise = 1.8, Return = 1.6, UsualFactor = 1, OnDays = 1 },
            WeeklyJump = limits.WeeklyJump with { Raise = 0.4, Return = 0.25, UsualFactor = 1.2, UnplannedFactor = 1.2, OnDays = 2, OffDays = 1 },
            SessionSpike = limits.SessionSpike with { LoadNotice = 0.4, RunNotice = 0.1, RunWarning = 0.3, SessionsWanted = 8 },
            FallingLoad = limits.FallingLoad with { Notice = 0.6, Days = 14, OnDays = 1 },
            StimulusGap = limits.StimulusGap with { NoticeDays = 10 },
            StimulusLow = limits.StimulusLow with { UsualShare = 0.5, OlderFloorDays = 3 },
            Silence = limits.Silence with { PlannedMissed = 2, ExtraDays = 2 },
            NotUsable = limits.NotUsable with { Sessions = 2 },
        });
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

    /// <summary>Only what says that weeks are even and days in a row are hard was off there.</summary>
    private static RuleLimits OfClinicBefore(Habits habits, RuleLimits limits) => habits == Habits.Clinic
        ? limits with { Monotony = limits.Monotony with { Enabled = false }, HardDays = limits.HardDays with { Enabled = false } }
        : limits;
}
