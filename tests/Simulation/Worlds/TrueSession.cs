using NodaTime;

namespace LoadWatch.Simulation.Worlds;

/// <summary>A session as it was, recorded or not.</summary>
/// <param name="Load">What it asked of the heart, or the kilograms lifted, in the unit of the group's load.</param>
/// <param name="Metres">Of a run; null elsewhere.</param>
/// <param name="HardEfforts">Hard bouts of the legs, or hard repetitions of a class, count.</param>
/// <param name="IsMatch">The match itself, on whatever date it was played.</param>
public sealed record TrueSession(LocalDate Date, double Load, double? Metres, int HardEfforts, bool IsMatch)
{
    /// <summary>What came of it; null: nothing was recorded.</summary>
    public Record? Recorded { get; init; }
}

/// <summary>What a session left behind.</summary>
/// <param name="Load">As read from the recording; null where the sensor failed.</param>
/// <param name="ArrivesOn">The date in whose night it is taken in.</param>
/// <param name="Source">The device or table.</param>
public sealed record Record(double? Load, LocalDate ArrivesOn, string Source);
