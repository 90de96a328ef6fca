using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>A stretch of dates on which the reference values that bear on a person's loads stay the same.</summary>
/// <param name="From">First date; the first period has the earliest there is.</param>
/// <param name="LoadFrom">Since when those that bear on the group's load, and on what stands in for it, are the same: <paramref name="From"/> or earlier.</param>
/// <param name="ValuesOn">The date whose values speak for the period.</param>
/// <param name="HeartRateOn">The same for heart rate: never later than heart rate is valid.</param>
/// <param name="Values">Those that bear on something that the group looks at, in the order of their kinds.</param>
public sealed record ReferencePeriod(
    LocalDate From, LocalDate LoadFrom, LocalDate ValuesOn, LocalDate HeartRateOn, IReadOnlyList<ReferenceValue> Values)
{
    /// <summary>Equal where every value is.</summary>
    public required string Basis { get; init; }

    /// <summary>Equal where every value is that bears on the group's load or on what stands in for it.</summary>
    public required string LoadBasis { get; init; }

    /// <summary>What is other than in an earlier period, in the order of the kinds.</summary>
    public IReadOnlyList<ReferenceChange> ChangesSince(ReferencePeriod former) =>
    [
        .. Values.Zip(former.Values)
            .Where(pair => pair.First.Value != pair.Second.Value)
            .Select(pair => new ReferenceChange(pair.First.Kind, pair.Second.Value, pair.First.Value)),
    ];
}

/// <param name="Value">In the unit of its kind; a maximal heart rate without an anchor by the birth year; null where there is none.</param>
public sealed record ReferenceValue(AnchorKind Kind, double? Value);

/// <summary>A reference value that became another; null where there was, or is, none.</summary>
public sealed record ReferenceChange(AnchorKind Kind, double? Before, double? Now)
{
    /// <summary>As tables write it.</summary>
    public string Name => AnchorKinds.Of(Kind).Name;

    public string Unit => AnchorKinds.Of(Kind).Unit;
}
