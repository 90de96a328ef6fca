namespace LoadWatch.Plans;

/// <summary>What is planned: a session of a date, or a phase of several.</summary>
public enum PlanWord
{
    Match,
    TeamSession,
    Class,

    /// <summary>No training; also a team's day off.</summary>
    Rest,
    Camp,
    Travel,
    LightWeek,
    OffSeason,

    /// <summary>Back from a break, with its own steps.</summary>
    Returning,
    ProgrammeStart,
}
