using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>What the day series needs to know of an activity.</summary>
/// <param name="Key">Key of the activity.</param>
/// <param name="Date">The local date that it counts for.</param>
/// <param name="Sources">The devices or layouts that recorded it (I-6).</param>
/// <param name="Load">The group's load quantity, or null where it could not be computed.</param>
/// <param name="AddsLoad">False where its load is already counted by another activity of the date: then its load, known or not, says nothing.</param>
public sealed record ActivityOnDay(
    string Key,
    LocalDate Date,
    IReadOnlyList<string> Sources,
    double? Load,
    IReadOnlyList<RegionStimulus> Stimulus,
    bool AddsLoad = true)
{
    /// <summary>What its day keeps of it; null: nothing looks back at it.</summary>
    public DaySession? Session { get; init; }
}
