using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// What counts of a person's training: recordings, with the rows of tables that join them or stand for a session alone. A date is joined by itself, so a range of
/// dates is read and joined as it stands. Computed when asked; kept is only what look-backs need (<see cref="LoadWatch.Days.DaySession"/>).
/// </summary>
public static class PersonTraining
{
    /// <param name="from">First date, or null.</param>
    /// <param name="to">Last date, or null.</param>
    public static JoinResult Of(
        StoreSession session, WorkingConfiguration configuration, TableBasis basis, Person person, LocalDate? from = null, LocalDate? to = null)
    {
        var recorded = session.Activities.OfPerson(person.Id, from, to)
            .Select(activity => new RecordedActivity(activity.Session, activity.Session.Clock, activity.Values) { Sources = [.. activity.Merge.Contributions.Select(one => one.Source)] })
            .ToList();
        var last = person.DayBeginsAt == LocalTime.Midnight ? to : to?.PlusDays(1);
        var sets = session.TableRows.OfPerson(person.Id, RowKind.Sets, from, last);
        var rows = session.TableRows.OfPerson(person.Id, RowKind.Sessions, from, last)
            .Concat(sets)
            .Select(row => new OwnedRow(row.Layout, row.Date, row.Key, row.Content).ByClockOf(person))
            .Where(row => !(row.Date < from) && !(row.Date > to))
            .ToList();
        return ActivityJoin.Join(person, recorded, rows, sets.Count == 0 ? AnchorBook.Empty : basis.AnchorsOf(person, from), configuration.Computation);
    }
}
