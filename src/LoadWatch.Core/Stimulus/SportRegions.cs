using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>The body regions that a sport goes through.</summary>
public static class SportRegions
{
    /// <summary>By <c>name/detail</c>, else by name, legs first; null where the table does not hold the sport.</summary>
    public static IReadOnlyList<BodyRegion>? Of(Sport sport, IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> sports) =>
        sports.TryGetValue(sport.ToString(), out var regions) || sports.TryGetValue(sport.Name, out regions) ? [.. regions.Distinct().Order()] : null;

    /// <summary>What is asked where the table does not hold it.</summary>
    public static string Question(Sport sport) => $"sport {sport}: which body regions?";
}
