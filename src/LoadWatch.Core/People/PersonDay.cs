using NodaTime;
using NodaTime.TimeZones;

namespace LoadWatch.People;

/// <summary>Which date a moment counts for. A day lasts from the time at which the person's day begins to the same time of the next date, 23 or 25 hours where clocks change.</summary>
public static class PersonDay
{
    /// <summary>Of the hour that comes twice the second, of the hour that is left out its end: until then something may still count for the date before.</summary>
    private static readonly ZoneLocalMappingResolver LastChance = Resolvers.CreateMappingResolver(Resolvers.ReturnLater, Resolvers.ReturnStartOfIntervalAfter);

    /// <summary>The date that a moment counts for by the clock of its place.</summary>
    public static LocalDate Of(LocalDateTime local, Person person) => local.TimeOfDay < person.DayBeginsAt ? local.Date.PlusDays(-1) : local.Date;

    /// <summary>The person's date at a moment, by the clock of their zone.</summary>
    public static LocalDate On(Instant now, Person person) => Of(now.InZone(person.Zone).LocalDateTime, person);

    /// <summary>
    /// The last date that is over in the person's zone. Where clocks go back over the beginning of a day, it does not begin before its time has passed for the last time.
    /// </summary>
    public static LocalDate LastOver(Instant now, Person person)
    {
        var today = On(now, person);
        var begins = person.Zone.ResolveLocal(today.At(person.DayBeginsAt), LastChance).ToInstant();
        return now < begins ? today.PlusDays(-2) : today.PlusDays(-1);
    }

    /// <summary>A clock that shows midnight when the person's day begins: sessions of one date are in order on it.</summary>
    public static LocalDateTime Clock(LocalDateTime local, Person person) => local.PlusNanoseconds(-person.DayBeginsAt.NanosecondOfDay);

    /// <summary>The reverse of <see cref="Clock"/>.</summary>
    public static LocalDateTime Local(LocalDateTime clock, Person person) => clock.PlusNanoseconds(person.DayBeginsAt.NanosecondOfDay);
}
