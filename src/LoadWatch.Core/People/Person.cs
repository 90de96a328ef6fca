using NodaTime;

namespace LoadWatch.People;

public enum Sex
{
    Female,
    Male,
}

/// <summary>Somebody who is watched: a line of the roster.</summary>
/// <param name="Id">Short name used in folders, files and commands; compared without regard to case.</param>
/// <param name="Name">The name that briefs show.</param>
/// <param name="Group">Id of the group.</param>
/// <param name="BirthYear">Gregorian year, or null.</param>
/// <param name="Sex">Null where not stated: then the mean of the two published pairs is used and marked.</param>
/// <param name="Zone">The zone by whose clock the person's day begins and ends.</param>
public sealed record Person(string Id, string Name, string Group, int? BirthYear, Sex? Sex, DateTimeZone Zone)
{
    /// <summary>Dates on which heart rate says nothing about this person's effort. The reason is never stored.</summary>
    public DatePeriods HeartRateInvalid { get; init; } = DatePeriods.Never;

    /// <summary>Local time at which the person's day begins, that of their group; what happens before it counts for the date before.</summary>
    public LocalTime DayBeginsAt { get; init; } = LocalTime.Midnight;

    /// <summary>Other names under which tables know this person: full names, player numbers.</summary>
    public IReadOnlyList<string> Aliases { get; init; } = [];

    public bool HeartRateIsValidOn(LocalDate date) => !HeartRateInvalid.Covers(date);

    /// <summary>Full years on 31 December of the date's year, or null.</summary>
    public int? AgeOn(LocalDate date) => BirthYear is { } year ? date.Year - year : null;
}
