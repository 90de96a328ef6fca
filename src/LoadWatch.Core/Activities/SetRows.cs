using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>Reads rows of a set log as working sets.</summary>
internal static class SetRows
{
    private const double HardestOfAll = 10;

    /// <summary>
    /// Hardness stands in for repetitions in reserve where those are not stated: at 10 nothing was left. A hold has no repetitions, and the number of a pin
    /// is no load in kilograms.
    /// </summary>
    public static StrengthSet Set(SetRow row, LocalDate date, DateTimeZone zone) => new(
        row.Time is { } time ? (date + time).InZoneLeniently(zone).ToInstant() : null,
        row.Seconds,
        Active: true,
        Exercise(row),
        row.IsHold ? null : row.Repetitions,
        row.Load == SetRowLoad.Pin ? null : row.Kilograms,
        row.RepetitionsInReserve ?? Reserve(row.Hardness));

    /// <summary>The word under which the table of exercises is asked; null where none is written.</summary>
    public static string? Exercise(SetRow row) => string.IsNullOrWhiteSpace(row.Exercise) ? null : row.Exercise;

    private static double? Reserve(double? hardness) => hardness is >= 0 and <= HardestOfAll ? HardestOfAll - hardness : null;
}
