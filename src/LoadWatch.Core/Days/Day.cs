using System.Collections.ObjectModel;
using System.Text.Json.Serialization;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Days;

public enum DayState
{
    /// <summary>At least one activity.</summary>
    Recorded,

    /// <summary>No training, stated or inferred.</summary>
    Rest,

    /// <summary>Nothing is known (yet).</summary>
    Unknown,
}

/// <summary>One person's local date with its trends. A value for a date uses only data dated that day or before (I-5); unknown is null.</summary>
public sealed record Day
{
    public required string Person { get; init; }

    public required LocalDate Date { get; init; }

    public required DayState State { get; init; }

    /// <summary>Why: <c>activities</c>, <c>inferred from device 255/7/1234</c>; null for unknown.</summary>
    public string? StateSource { get; init; }

    /// <summary>Load of the date: 0 for rest, null when unknown or when an activity's load could not be computed.</summary>
    public double? Load { get; init; }

    /// <summary>
    /// Standard error of the load, in its unit: the root of the sum of squares of those of the sessions whose load was converted; null where none was, or the load is
    /// unknown. What a load has by its own method is not in it.
    /// </summary>
    public double? LoadError { get; init; }

    /// <summary>Sum of the last 7 days, scaled to 7 covered days; null under 5 covered days.</summary>
    public double? Acute { get; init; }

    /// <summary>Mean week of the last 28 days, scaled to the covered days; null under 22 covered days or within the first 28.</summary>
    public double? Chronic { get; init; }

    /// <summary>Mean week of days 8 to 28 back, scaled; the denominator of the uncoupled ratio.</summary>
    public double? ChronicBefore { get; init; }

    public double? RatioCoupled { get; init; }

    public double? RatioUncoupled { get; init; }

    /// <summary>Ratio of the exponentially weighted averages of 7 and 28 days.</summary>
    public double? RatioEwma { get; init; }

    /// <summary>Exponentially weighted average of 7 days, load per day.</summary>
    public double? EwmaAcute { get; init; }

    /// <summary>Exponentially weighted average of 28 days, load per day.</summary>
    public double? EwmaChronic { get; init; }

    /// <summary>(Last 7 days - the 7 before) / the 7 before, both scaled; fraction.</summary>
    public double? WeeklyChange { get; init; }

    /// <summary>
    /// The same against the last week before that plan and answers do not set aside and that holds some load; null where one of the two is not known.
    /// </summary>
    public double? WeeklyChangeOrdinary { get; init; }

    /// <summary>The usual week: the median of the 8 newest ordinary weeks of the 16 before the last 7 days; null under 6 of them.</summary>
    public double? UsualWeek { get; init; }

    /// <summary>Load of the largest session of the last 30 days, this one among them; null without any.</summary>
    public double? LargestSession30 { get; init; }

    /// <summary>Distance of the longest run of the last 30 days, this one among them, metres; null without any.</summary>
    public double? LongestRunMetres30 { get; init; }

    public double? Monotony { get; init; }

    public double? Strain { get; init; }

    /// <summary>Median of <see cref="Chronic"/> over the last 365 days.</summary>
    public double? ChronicMedian { get; init; }

    /// <summary>Share of the last 7 days with known load, 0 to 1.</summary>
    public double Coverage7 { get; init; }

    /// <summary>Share of the last 28 days with known load, 0 to 1.</summary>
    public double Coverage28 { get; init; }

    /// <summary>Days from the first day with known load to this date, 0 on that day; null before any.</summary>
    public int? DaysSinceFirstCovered { get; init; }

    /// <summary>Days since the last recorded day, 0 on a recorded day; null before any.</summary>
    public int? DaysSinceRecorded { get; init; }

    /// <summary>What plan and answers say of the date.</summary>
    public DayPlan Plan { get; init; } = DayPlan.None;

    public IReadOnlyDictionary<BodyRegion, RegionDay> Regions { get; init; } = ReadOnlyDictionary<BodyRegion, RegionDay>.Empty;

    /// <summary>What later dates need of its sessions, in key order. Days read for a brief or an export hold none.</summary>
    public IReadOnlyList<DaySession> Sessions { get; init; } = [];

    /// <summary>What is carried to the next date. Days read for a brief or an export hold nothing.</summary>
    public Carried Carried { get; init; } = Carried.Nothing;
}

/// <summary>The stimulus side of a day for one body region.</summary>
/// <param name="HeavyOrFast">Whether the date counts as heavy or fast; null where no channel could have seen it.</param>
/// <param name="Days7">Heavy-or-fast days among the last 7; null when none of them is known.</param>
/// <param name="Days28">The same for 28 days.</param>
/// <param name="DaysSince">
/// Days since the last heavy-or-fast day, 0 on one; where there was none, days since the region's first covered day; null before any.
/// </param>
/// <param name="KnownDaysSince">How many of the days after the last heavy-or-fast day up to this date are known.</param>
/// <param name="UsualGapDays">The person's usual gap between heavy-or-fast days: the median over the last 365 days, days; null under 4 gaps.</param>
public sealed record RegionDay(bool? HeavyOrFast, int? Days7, int? Days28, int? DaysSince, int KnownDaysSince, double? UsualGapDays)
{
    /// <summary>There was no heavy-or-fast day since the region can be seen, however long ago.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingDefault)]
    public bool Never { get; init; }

    /// <summary>Heavy-or-fast days among the last 14; null when none of them is known.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public int? Days14 { get; init; }

    /// <summary>The person's usual number in 14 days, from the 56 before them; null where less than 70 % of those is known.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? Usual14 { get; init; }

    /// <summary>How many of the last 7 days are known.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingDefault)]
    public int Known7 { get; init; }

    /// <summary>The same of 14 days.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingDefault)]
    public int Known14 { get; init; }

    /// <summary>The same of 28 days.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingDefault)]
    public int Known28 { get; init; }

    /// <summary>Before any channel could see the region.</summary>
    public static RegionDay NotCovered { get; } = new(null, null, null, null, 0, null);
}
