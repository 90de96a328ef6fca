using NodaTime;

namespace LoadWatch.Loads;

/// <summary>What choosing the load of a session needs of sessions of any age.</summary>
/// <param name="FirstWanted">The first date with a load of the group's kind; null before any.</param>
/// <param name="LastLines">The last line that there was, by what it converts from.</param>
public sealed record CarriedLoads(LocalDate? FirstWanted, IReadOnlyDictionary<string, ConversionLine> LastLines);
