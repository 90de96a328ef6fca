using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Limits;

/// <summary>
/// How much load a date may hold inside the limits that the user set, told before the date begins. A figure to plan with, not a target and not a debt: nothing
/// counts how much of it was used.
/// </summary>
public sealed record TodaysRoom
{
    public required string Person { get; init; }

    public required LocalDate Date { get; init; }

    /// <summary>Name of the quantity that is the group's load.</summary>
    public required string LoadQuantity { get; init; }

    /// <summary>Up to this load of the date, from none on, no limit is passed, and it is no larger than the largest day of the last 30. Null with the reason.</summary>
    public double? Load { get; init; }

    /// <summary>Why there is no figure; null where there is one.</summary>
    public NoRoom? Reason { get; init; }

    /// <summary>Name of the rule whose limit a little more would pass; null where the largest day of the last 30 is the bound.</summary>
    public string? HeldBy { get; init; }

    /// <summary>The limit is passed even without any load on the date: then <see cref="Load"/> is 0.</summary>
    public bool IsPassedAtRest { get; init; }

    /// <summary>The largest known load of one of the 30 dates before; null where there is none.</summary>
    public double? LargestDay { get; init; }

    public LocalDate? LargestDayOn { get; init; }

    /// <summary>Heavy-or-fast days of the week before the date, by region, legs first; only regions that can be seen.</summary>
    public IReadOnlyList<HeavyWeek> Regions { get; init; } = [];
}

/// <summary>Why there is no figure.</summary>
public enum NoRoom
{
    /// <summary>Ill, injured or away: which of them is not told here.</summary>
    Absent,

    /// <summary>Back from a break: what was usual before it is no measure yet.</summary>
    Returning,

    /// <summary>Too few known days for a week and a usual one.</summary>
    TooLittleKnown,

    /// <summary>No load above nought in the last 30 days.</summary>
    NoTrainingDay,
}

/// <summary>Heavy-or-fast days of a body region in the 7 days before a date, against the usual.</summary>
/// <param name="Days">Null where none of them is known.</param>
/// <param name="Known">How many of the 7 days are known.</param>
/// <param name="UsualDays">Half of the person's usual number in 14 days; null where that is not known.</param>
/// <param name="IsReached">Null where the usual is not known or is none, or fewer than 5 of the days are known.</param>
public sealed record HeavyWeek(BodyRegion Region, int? Days, int Known, double? UsualDays, bool? IsReached);
