using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;

namespace LoadWatch.Service.Pipeline;

/// <summary>What counts of a person's training: recordings, with the rows of tables that join them or stand for a session alone. Computed when asked, never stored.</summary>
public static class PersonTraining
{
    public static JoinResult Of(StoreSession session, WorkingConfiguration configuration, TableBasis basis, Person person)
    {
        var recorded = session.Activities.OfPerson(person.Id)
            .Select(activity => new RecordedActivity(activity.Session, activity.Session.Start.WithOffset(activity.Session.LocalOffset).LocalDateTime, activity.Values) { Sources = [.. activity.Merge.Contributions.Select(one => one.Source)] })
            .ToList();
        var rows = session.TableRows.OfPerson(person.Id, RowKind.Sessions)
            .Concat(session.TableRows.OfPerson(person.Id, RowKind.Sets))
            .Select(row => new OwnedRow(row.Layout, row.Date, row.Key, row.Content))
            .ToList();
        return ActivityJoin.Join(person, recorded, rows, basis.Anchors, configuration.Computation);
    }
}
