using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Page;
using LoadWatch.Delivery.Webhook;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Builds the briefs of contacts from what is stored, and decides those that are due.</summary>
/// <param name="unreadable">Files that the sweep could not read, by path.</param>
/// <param name="inboxesAway">Names of inboxes that the sweep could not look into.</param>
public sealed class Briefs(WorkingConfiguration configuration, Instant now, IReadOnlyList<BriefLine> unreadable, IReadOnlyList<string> inboxesAway)
{
    private const int RefusedDays = 7;

    /// <summary>Freezes every brief that is due, and every update of a changed list, with its deliveries.</summary>
    /// <returns>How many were decided.</returns>
    public int Decide(StoreSession session)
    {
        var people = People(session);
        return configuration.Contacts.Count(contact => DecideBrief(session, people, contact) || DecideUpdate(session, people, contact));
    }

    private bool DecideBrief(StoreSession session, BriefPeople people, Contact contact)
    {
        var last = session.Notices.LastBrief(contact.Id, LocalDate.MaxIsoValue)?.Date;
        if (NoticePolicy.Decide(contact, now, last, session.Notices.Exists) is not { Reason: NoticeReason.BriefDue, Date: var date })
        {
            return false;
        }

        var brief = Build(session, people, contact, date);
        var notice = Write(contact, brief, NoticePolicy.BriefKey(contact, brief.Date), BriefText.Subject(brief), NoticeReason.BriefDue);
        var flagged = brief.DataUpTo is null ? null : Flagged(people, contact);
        return Freeze(session, notice with { Flagged = flagged }, Ways(contact));
    }

    /// <summary>Only what leaves the machine is told twice, to whoever is told who is to be looked at: the page is rewritten anyway.</summary>
    private bool DecideUpdate(StoreSession session, BriefPeople people, Contact contact)
    {
        var date = now.InZone(contact.Zone).Date;
        var ways = Ways(contact).Where(way => way.Channel is MailChannel.ChannelName or WebhookChannel.ChannelName).ToList();
        if (ways.Count == 0 || !contact.Forms.Contains(BriefForm.Daily) || session.Notices.Get(NoticePolicy.BriefKey(contact, date))?.Flagged is not { } told)
        {
            return false;
        }

        var standing = Flagged(people, contact);
        if (NoticePolicy.DecideUpdate(contact, date, told, standing, session.Notices.Exists) != NoticeReason.ListChanged)
        {
            return false;
        }

        var built = Build(session, people, contact);
        var brief = built with { FirstLine = $"{FlaggedList.ChangeInWords(told, standing)} {built.FirstLine}" };
        var notice = Write(contact, brief, NoticePolicy.UpdateKey(contact, date), BriefText.UpdateSubject(brief), NoticeReason.ListChanged);
        return Freeze(session, notice with { Flagged = standing }, ways);
    }

    private Notice Write(Contact contact, Brief brief, string key, string subject, NoticeReason reason)
    {
        var notice = new Notice(key, contact.Id, brief.Date, subject, BriefText.Write(brief), PageRenderer.Render(brief), reason);
        var mailed = MailNames.Of(brief, contact.Names, configuration.People.Values);
        return notice with
        {
            MailText = contact.Names == NamesShown.Full ? null : BriefText.Write(mailed),
            MailHtml = IsMailed(contact) ? MailRenderer.Render(mailed) : null,
        };
    }

    private bool Freeze(StoreSession session, Notice notice, IReadOnlyList<Storage.Notices.Delivery> ways) =>
        session.Notices.Add(notice with { Decided = now }, session.Alerts.Changes.LastPosition(), ways);

    /// <summary>Where a contact's notices go.</summary>
    private List<Storage.Notices.Delivery> Ways(Contact contact)
    {
        List<Storage.Notices.Delivery> ways = [new("page", contact.Id), new("log", contact.Id)];
        if (IsMailed(contact))
        {
            ways.Add(new Storage.Notices.Delivery(MailChannel.ChannelName, contact.Mail!));
        }

        if (configuration.Webhook?.Addresses.ContainsKey(contact.Id) == true)
        {
            ways.Add(new Storage.Notices.Delivery(WebhookChannel.ChannelName, contact.Id));
        }

        return ways;
    }

    private bool IsMailed(Contact contact) => configuration.Mail is not null && contact.Mail is not null;

    /// <summary>Of what the contact may be told: an alert that is not for them changes no list of theirs.</summary>
    private string Flagged(BriefPeople people, Contact contact)
    {
        var told = configuration.PeopleOf(contact).ToList();
        var view = RoleView.Of(contact.Role, told.Count);
        return FlaggedList.Of(told.SelectMany(person => people.Open(person.Id)).Where(alert => view.ShowsRule(alert.Key.Rule)));
    }

    /// <summary>What the briefs of one session are built from: the same for all contacts.</summary>
    public BriefPeople People(StoreSession session) => new(configuration, now, inboxesAway, session);

    /// <summary>The contact's brief as of now, due or not.</summary>
    public Brief Build(StoreSession session, Contact contact) => Build(session, People(session), contact);

    /// <param name="people">Of the same session.</param>
    public Brief Build(StoreSession session, BriefPeople people, Contact contact) => Build(session, people, contact, now.InZone(contact.Zone).Date);

    private Brief Build(StoreSession session, BriefPeople people, Contact contact, LocalDate date)
    {
        // New is what no brief of an earlier date told: the page of a morning stays the same after that morning's brief was decided.
        var earlier = session.Notices.LastBrief(contact.Id, date);
        var told = earlier ?? session.Notices.LastBrief(contact.Id, date.PlusDays(1));
        var subjects = people.Of(contact, date, told?.AlertPosition, isFirst: earlier is null);
        return BriefBuilder.Build(contact, date, subjects, Questions(session, contact));
    }

    private List<BriefLine> Questions(StoreSession session, Contact contact) =>
    [
        .. MissedNotices.Lines(session, contact, Ways(contact), now),
        .. inboxesAway.Select(inbox => new BriefLine(inbox, "this inbox cannot be looked into: nothing comes in from it until its folder is back")),
        .. NothingArrived.Line(session, contact, now) is { } dry ? [dry] : Array.Empty<BriefLine>(),
        .. Files(session, contact),
        .. new OpenQuestions(configuration, now).Lines(session, contact, now.InZone(contact.Zone).Date),
        .. contact.People.Count > 0 || contact.Role == ContactRole.FrontDesk ? [] : new Answers(configuration, now).Questions(session),
    ];

    private List<BriefLine> Files(StoreSession session, Contact contact)
    {
        var people = configuration.PeopleOf(contact).Select(person => person.Id).ToHashSet(StringComparer.Ordinal);
        return session.Arrivals.InState(ArrivalState.Held)
            .Concat(session.Arrivals.InState(ArrivalState.Refused))
            .Select(arrival => (arrival, Sightings: session.Sightings.Of(arrival.Sha)))
            .Where(item => Concerns(Claims(item.Sightings), contact, people) && (item.arrival.State == ArrivalState.Held || (IsRecent(item.Sightings) && item.Sightings.Any(sighting => sighting.Latest))))
            .Select(item => new BriefLine(item.Sightings[0].Path, Sentence(item.arrival)))
            .Concat(unreadable.Where(line => Concerns(Attribution.ByFolder([line.Subject], configuration.People), contact, people)).Select(line => line with { Sentence = $"cannot be read: {line.Sentence}" }))
            .OrderBy(line => line.Subject, StringComparer.Ordinal)
            .ToList();
    }

    /// <summary>Files of nobody concern every contact of a group; files of somebody only those who are told about that person.</summary>
    private static bool Concerns(IReadOnlyList<string> claims, Contact contact, HashSet<string> people) =>
        claims.Count == 0 ? contact.People.Count == 0 : claims.Any(people.Contains);

    private IReadOnlyList<string> Claims(IReadOnlyList<Sighting> sightings) =>
        Attribution.Claims(null, [.. sightings.Select(sighting => new SeenName(sighting.Inbox, sighting.Path))], configuration);

    private bool IsRecent(IReadOnlyList<Sighting> sightings) =>
        sightings.Any(sighting => sighting.FirstSeen >= now - Duration.FromDays(RefusedDays));

    private static string Sentence(Arrival arrival) => arrival.State == ArrivalState.Held
        ? $"held: {arrival.Reason}"
        : $"not usable: {arrival.Reason}";
}
