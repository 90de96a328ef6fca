using LoadWatch.Days;
using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.People;

/// <summary>A squad or class.</summary>
/// <param name="LoadQuantity">Name of the quantity that is this group's load, <c>banister_trimp</c> by default.</param>
public sealed record Group(string Id, string Name, string LoadQuantity, RuleLimits Limits)
{
    /// <summary>Names of the quantities that stand in, in this order, where a session lacks the load; each converted by the person's own sessions.</summary>
    public IReadOnlyList<string> LoadFallbacks { get; init; } = [];

    /// <summary>Local time at which a day of its people begins.</summary>
    public LocalTime DayBeginsAt { get; init; } = LocalTime.Midnight;

    /// <summary>The standard deviation that the monotony of its people rests on; the same for all groups.</summary>
    public LoadDeviation Deviation { get; init; } = LoadDeviation.Sample;
}
