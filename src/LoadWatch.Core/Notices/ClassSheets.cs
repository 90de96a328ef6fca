using LoadWatch.Limits;
using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime.Text;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Who is planned today, session by session.</summary>
internal static class ClassSheets
{
    private const int NotesShown = 2;

    private static readonly LocalTimePattern Time = LocalTimePattern.CreateWithInvariantCulture("HH:mm");

    /// <summary>Sheets by time, then by group; those without a time last.</summary>
    public static IReadOnlyList<ClassSheet> Of(IReadOnlyList<BriefSubject> shown, LocalDate date, RoleView view) =>
    [
        .. shown
            .SelectMany(subject => subject.Planned.Where(IsSession).Distinct().Select(entry => (Subject: subject, Entry: entry, Heading: Heading(subject.Group, entry))))
            .GroupBy(one => (one.Entry.Start, one.Heading))
            .OrderBy(same => same.Key.Start ?? LocalTime.MaxValue)
            .ThenBy(same => same.Key.Heading, StringComparer.Ordinal)
            .Select(same => new ClassSheet(same.Key.Heading, [.. same.Select(one => PersonOf(one.Subject, date, view)).DistinctBy(person => person.PersonId, StringComparer.Ordinal)])),
    ];

    private static bool IsSession(PlanEntry entry) => entry.Word is PlanWord.Class or PlanWord.TeamSession or PlanWord.Match;

    private static string Heading(Group group, PlanEntry entry) => $"{OneLine.Of(group.Name)}, {Kind(entry)}{When(entry)}";

    private static string Kind(PlanEntry entry) => entry.Word switch
    {
        PlanWord.Class => "class",
        PlanWord.Match => "match",
        _ => "team session",
    };

    private static string When(PlanEntry entry) => (entry.Start, entry.End) switch
    {
        (null, _) => "",
        ({ } start, null) => $" at {Time.Format(start)}",
        ({ } start, { } end) => $" from {Time.Format(start)} to {Time.Format(end)}",
    };

    private static ClassPerson PersonOf(BriefSubject subject, LocalDate date, RoleView view)
    {
        var away = PersonNotes.Away(subject, date, view);
        var notes = away is null ? Notes(subject, date.PlusDays(-1)).Distinct(StringComparer.Ordinal).ToList() : [away];
        var shown = notes.Count > NotesShown ? notes.Take(NotesShown).Append($"and {notes.Count - NotesShown} more") : notes;
        var note = string.Join("; ", shown);
        return new ClassPerson(subject.Person.Id, BriefBuilder.NameOf(subject.Person, self: false), note.Length == 0 ? null : OneLine.Sentence(note), away is not null)
        {
            Room = away is null && subject.Room is { Load: not null } room && room.Date == date ? OneLine.Sentence(RoomWords.Of(room)) : null,
        };
    }

    private static IEnumerable<string> Notes(BriefSubject subject, LocalDate upTo)
    {
        if (ReturnDay(subject) is { } day)
        {
            yield return $"returning, day {day}";
        }

        foreach (var news in BriefBuilder.Active(subject))
        {
            yield return PersonNotes.Of(news, subject, upTo);
        }

        if (PersonNotes.LastRecorded(subject) is null)
        {
            yield return "nothing recorded yet";
        }
    }

    private static int? ReturnDay(BriefSubject subject) => subject.Today is { } today ? today.ReturnDay : subject.Days is [.., var last] ? last.Plan.ReturnDay : null;
}
