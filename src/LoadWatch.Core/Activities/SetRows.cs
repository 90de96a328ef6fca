using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>Reads rows of a set log as working sets.</summary>
internal static class SetRows
{
    /// <summary>The number of a pin is no load in kilograms.</summary>
    public static StrengthSet Set(SetRow row, LocalDate date, Person person) => new(
        row.Time is { } time ? PersonDay.Local(date + time, person).InZoneLeniently(person.Zone).ToInstant() : null,
        row.Seconds,
        Active: true,
        Exercise(row),
        row.Repetitions,
        row.Kilograms,
        row.RepetitionsInReserve)
    {
        Machine = string.IsNullOrWhiteSpace(row.Machine) ? null : row.Machine,
        Hardness = row.Hardness,
        Load = LoadOf(row),
        Pin = row.Pin,
        IsHold = row.IsHold,
        IsFast = row.IsFast,
        BarSpeedMetresPerSecond = row.BarSpeedMetresPerSecond,
    };

    /// <summary>The word under which the table of exercises is asked; null where none is written.</summary>
    public static string? Exercise(SetRow row) => string.IsNullOrWhiteSpace(row.Exercise) ? null : row.Exercise;

    /// <summary>A pin's number without kilograms says how the load was made, whatever the column says.</summary>
    private static SetLoad LoadOf(SetRow row) => row is { Pin: not null, Kilograms: null } ? SetLoad.Pin : row.Load;
}
