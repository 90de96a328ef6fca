using NodaTime;

namespace LoadWatch.Findings;

/// <summary>One session beyond the largest of the days before.</summary>
/// <param name="OfRun">By running distance, metres; else by load, in the unit of the group's load.</param>
/// <param name="Value">Of the session.</param>
/// <param name="Largest">Of the sessions before.</param>
/// <param name="Sessions">Sessions before that were compared, count.</param>
/// <param name="Excess">(value - largest) / largest.</param>
internal sealed record SessionSpike(
    LocalDate Date, bool OfRun, double Value, double Largest, LocalDate LargestOn, int Sessions, double Excess, Severity Severity);
