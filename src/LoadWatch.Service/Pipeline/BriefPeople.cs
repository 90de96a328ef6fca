using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// What briefs are built from, read within one session, once for all contacts: of most people the days of a strip, of few as many as their pictures and breaks
/// want.
/// </summary>
/// <param name="inboxesAway">Names of inboxes that cannot be looked into.</param>
public sealed class BriefPeople(WorkingConfiguration configuration, Instant now, IReadOnlyList<string> inboxesAway, StoreSession session)
{
    private const int RemarkDays = 14;

    /// <summary>A note is told for a week; it may stand for twelve.</summary>
    private const int NoteDays = 7;

    private readonly Dictionary<string, BriefSubject> recent = new(StringComparer.Ordinal);
    private readonly Dictionary<string, IReadOnlyList<Day>> pictured = new(StringComparer.Ordinal);
    private readonly Dictionary<(string Person, LocalDate Date), BriefSubject> planned = [];
    private readonly Dictionary<long, AlertsSince> since = [];
    private ILookup<string, Alert>? open;

    /// <summary>A person's alerts that are not normal.</summary>
    public IEnumerable<Alert> Open(string person) => (open ??= session.Alerts.Open().ToLookup(alert => alert.Key.Person, StringComparer.Ordinal))[person];

    /// <summary>Everybody of whom a contact is told, as on a date.</summary>
    /// <param name="told">The position among the changes of alerts up to which the contact was told; null: nothing yet.</param>
    /// <param name="isFirst">No earlier date had a brief: all that stands is new.</param>
    public IReadOnlyList<BriefSubject> Of(Contact contact, LocalDate date, long? told, bool isFirst)
    {
        var news = told is { } position ? Since(position) : null;
        var withPlan = BriefForms.On(contact, date).Contains(BriefForm.ClassSheet);
        var subjects = configuration.PeopleOf(contact)
            .Select(person => (withPlan ? Planned(person, date) : Recent(person)) with { Alerts = Alerts(person, news, isFirst) })
            .ToList();
        var named = BriefBuilder.Pictured(contact, date, subjects);
        return subjects.ConvertAll(subject => named.Contains(subject.Person.Id) ? subject with { Days = Pictured(subject) } : subject);
    }

    private BriefSubject Recent(Person person)
    {
        if (!recent.TryGetValue(person.Id, out var subject))
        {
            var through = DayUpdate.LastDateOver(person, now);
            var days = Days(person, BriefDays.Usual);
            var findings = session.Findings.Unraised(person.Id, through);
            subject = new BriefSubject(person, configuration.GroupOf(person), days, [], Remarks(days))
            {
                Notes = Notes(person, through, [.. findings.Where(IsNote)]),
                Suppressed = [.. findings.Where(finding => finding.Severity == Severity.Suppressed)],
                Room = session.Rooms.Of(person.Id) is { } room && room.Date == through.PlusDays(1) ? room : null,
                InboxIsAway = IsInboxAway(person),
            };
            recent[person.Id] = subject = WithBreak(subject);
        }

        return subject;
    }

    /// <summary>Whether an inbox is away by which the person's latest recording came; of whom there is none, nobody knows by which they would.</summary>
    private bool IsInboxAway(Person person) =>
        inboxesAway.Count > 0 && (session.Sightings.InboxesOfLatest(person.Id) is not { Count: > 0 } inboxes || inboxes.Any(inboxesAway.Contains));

    private BriefSubject Planned(Person person, LocalDate date)
    {
        if (!planned.TryGetValue((person.Id, date), out var subject))
        {
            var plan = new PersonPlans(configuration).Of(session, person, date, date);
            planned[(person.Id, date)] = subject = Recent(person) with { Planned = [.. plan.EntriesOn(date)], Today = plan.On(date) };
        }

        return subject;
    }

    private IReadOnlyList<Day> Pictured(BriefSubject subject)
    {
        if (!pictured.TryGetValue(subject.Person.Id, out var days))
        {
            pictured[subject.Person.Id] = days = subject.Days.Count >= BriefDays.OfPicture ? subject.Days : Days(subject.Person, BriefDays.OfPicture);
        }

        return days;
    }

    /// <summary>As far back as a break reaches that the brief tells of.</summary>
    private BriefSubject WithBreak(BriefSubject subject)
    {
        while (BriefDays.WantsMore(subject))
        {
            var more = Days(subject.Person, Math.Min(BriefDays.AtMost, 2 * subject.Days.Count));
            if (more.Count <= subject.Days.Count)
            {
                break;
            }

            subject = subject with { Days = more };
        }

        return subject;
    }

    private IReadOnlyList<Day> Days(Person person, int count)
    {
        var through = DayUpdate.LastDateOver(person, now);
        return session.Days.OfPerson(person.Id, through.PlusDays(1 - count), through);
    }

    /// <summary>A contact who was never told anything is told of no return.</summary>
    private List<AlertNews> Alerts(Person person, AlertsSince? news, bool isFirst) =>
    [
        .. Open(person.Id).Where(alert => alert.State is AlertState.Unacknowledged or AlertState.Acknowledged).Select(alert => new AlertNews(alert, isFirst || news!.IsNew(alert.Id), false, false)),
        .. news?.OverOf(person.Id) ?? [],
    ];

    private AlertsSince Since(long position)
    {
        if (!since.TryGetValue(position, out var news))
        {
            since[position] = news = new AlertsSince(session, position);
        }

        return news;
    }

    /// <summary>Told for a week from the day on which each came to be a note.</summary>
    private List<Finding> Notes(Person person, LocalDate date, List<Finding> notes)
    {
        if (notes.Count == 0)
        {
            return [];
        }

        var told = session.Findings.Unraised(person.Id, date.PlusDays(-NoteDays)).Where(IsNote).Select(note => note.Key).ToHashSet();
        return [.. notes.Where(note => !told.Contains(note.Key))];
    }

    private static bool IsNote(Finding finding) => finding.Severity == Severity.Note;

    private static List<string> Remarks(IReadOnlyList<Day> days)
    {
        var recorded = days.TakeLast(RemarkDays).Where(day => day.State == DayState.Recorded).ToList();
        var without = recorded.Count(day => day.Load is null);
        return without == 0
            ? []
            : [$"load unknown on {without} of {recorded.Count} recorded days of the last {RemarkDays}: no usable heart rate, or a reference value is missing"];
    }
}
