using LoadWatch.Days;
using LoadWatch.Storage;

namespace LoadWatch.Service.Export;

/// <summary>The last computed day of a person.</summary>
public static class LastDay
{
    /// <summary>Null before any recording.</summary>
    public static Day? Of(StoreSession session, string person) =>
        session.People.ComputedTo(person) is { } date ? session.Days.OfPerson(person, date, date).FirstOrDefault() : null;
}
