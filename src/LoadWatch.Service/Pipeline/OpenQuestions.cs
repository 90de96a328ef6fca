using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>What tables leave open, as lines of a brief: rows that fit no one recording, rows of nobody, exercises without a body region.</summary>
public sealed class OpenQuestions(WorkingConfiguration configuration, Instant now)
{
    private const int DaysBack = 14;

    /// <summary>How long after a table or file came it is asked about.</summary>
    private static readonly Duration Asked = Duration.FromDays(DaysBack);

    /// <param name="today">Only rows of the 14 days before it are asked about.</param>
    public IEnumerable<BriefLine> Lines(StoreSession session, Contact contact, LocalDate today)
    {
        var people = configuration.PeopleOf(contact).ToDictionary(person => person.Id, StringComparer.Ordinal);
        var from = today.PlusDays(-DaysBack);
        return session.Questions.Since(from)
            .Where(question => people.ContainsKey(question.Person) && question.Date <= today)
            .GroupBy(question => question.Sentence, StringComparer.Ordinal)
            .Select(same => new BriefLine(Named([.. same.Select(question => people[question.Person].Name).Distinct(StringComparer.Ordinal)]), same.Key))
            .Concat(contact.People.Count > 0 ? [] : [.. OfContents(session), .. OfNobody(session, RoleView.Of(contact.Role).ShowsHealth)]);
    }

    /// <summary>What several people leave open alike is asked once.</summary>
    private static string Named(IReadOnlyList<string> names) => names.Count == 1 ? names[0] : $"{names.Count} people";

    /// <summary>Of contents that were seen lately and are still what their name holds: a later version settles what an earlier one left open.</summary>
    private IEnumerable<BriefLine> OfContents(StoreSession session) => session.Questions.OfContents()
        .Select(question => (question.Sentence, Name: session.Sightings.Of(question.Sha).FirstOrDefault(name => name.Latest && name.Since >= now - Asked)))
        .Where(question => question.Name is not null)
        .Select(question => new BriefLine(question.Name!.Path, question.Sentence));

    private IEnumerable<BriefLine> OfNobody(StoreSession session, bool showsHealth) => session.TableRows.OfNobody()
        .Concat(session.TableRows.OfKind(RowKind.Plan).Where(IsOfNobody))
        .Where(row => row.Since >= now - Asked && (showsHealth || row.Kind is not (RowKind.Tests or RowKind.Days)))
        .GroupBy(row => (row.Scope, row.Subject))
        .OrderBy(same => same.Key.Scope, StringComparer.Ordinal)
        .ThenBy(same => same.Key.Subject, StringComparer.Ordinal)
        .Select(same => new BriefLine(NameOf(same.Key.Scope), Sentence(same.Key.Subject, same.ToList())));

    private bool IsOfNobody(StoredRow row) => row is { Person: null, Subject.Length: > 0 } && configuration.Subjects.Of(row) is null;

    private static string Sentence(string subject, List<StoredRow> rows)
    {
        var dates = FormattableString.Invariant($"{rows.Count} {(rows.Count == 1 ? "row" : "rows")} from {rows.Min(row => row.Date):d MMMM uuuu} on");
        return subject.Length == 0
            ? $"{dates} name nobody, and no folder above the file does"
            : $"{dates} {(rows.Count == 1 ? "is" : "are")} of \"{subject}\", who is not in the roster: a line there, or an alias, takes {(rows.Count == 1 ? "it" : "them")} up";
    }

    private static string NameOf(string scope) => scope[(scope.IndexOf('/', StringComparison.Ordinal) + 1)..].Split('|')[0];
}
