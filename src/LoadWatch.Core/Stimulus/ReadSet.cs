using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>A working set with how it was read.</summary>
/// <param name="Regions">That its exercise goes through; empty where that is not known.</param>
/// <param name="Demand">Null where it could not be read.</param>
/// <param name="Missing">What would have to be known for it; null where it was read.</param>
public sealed record ReadSet(StrengthSet Set, IReadOnlyList<BodyRegion> Regions, SetDemand? Demand, string? Missing)
{
    /// <summary>In canonical form; null where none is written.</summary>
    public string? Exercise => ExerciseWord.Canonical(Set.Exercise);
}
