using LoadWatch.Delivery.Mail;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Services;
using NodaTime;

namespace LoadWatch.Service.Health;

/// <summary>
/// Tells those who look after the service once a day how it is, and at once what is critical, each trouble once. Decided and delivered as every notice is
/// (I-7); nothing in it is about people.
/// </summary>
public sealed class ServiceNotices(WorkingConfiguration configuration, Instant now)
{
    private const string MailTrouble = "mail-not-leaving";

    /// <summary>Decides, and delivers at once what was decided: the next sweep may be a night away.</summary>
    public void Tell(Store store, ServiceStatus status, SweepReport report)
    {
        if (store.Write(session => Decide(session, status)) > 0)
        {
            new Deliveries(store, configuration, report).Run(now);
        }
    }

    /// <returns>How many were decided.</returns>
    public int Decide(StoreSession session, ServiceStatus status)
    {
        var begun = Follow(session, [.. status.Troubles.Where(trouble => trouble.Critical)]);
        return configuration.Administrators.Sum(administrator =>
            begun.Count(trouble => DecideTrouble(session, administrator, trouble)) + (DecideReport(session, administrator, status) ? 1 : 0));
    }

    /// <summary>Keeps the list of what stands.</summary>
    /// <returns>What has begun.</returns>
    private List<StandingTrouble> Follow(StoreSession session, List<Trouble> critical)
    {
        var standing = session.Troubles.All();
        foreach (var over in standing.Where(known => !critical.Exists(trouble => trouble.Name == known.Name)))
        {
            session.Troubles.End(over.Name);
        }

        var begun = critical.Where(trouble => !standing.Any(known => known.Name == trouble.Name))
            .Select(trouble => new StandingTrouble(trouble.Name, now, trouble.Sentence))
            .ToList();
        begun.ForEach(session.Troubles.Begin);
        return begun;
    }

    /// <summary>A trouble that comes and goes is told once a day.</summary>
    private bool DecideTrouble(StoreSession session, Administrator administrator, StandingTrouble trouble)
    {
        var date = now.InZone(administrator.Zone).Date;
        var text = ServiceReportText.OfTrouble(trouble.Sentence);
        return Freeze(session, administrator, $"trouble-{trouble.Name}", date, ServiceReportText.TroubleSubject, text, NoticeReason.ServiceTrouble);
    }

    private bool DecideReport(StoreSession session, Administrator administrator, ServiceStatus status)
    {
        var date = now.InZone(administrator.Zone).Date;
        return now >= date.At(administrator.ReportAt).InZoneLeniently(administrator.Zone).ToInstant()
            && !session.Notices.Exists(Key(administrator, "service", date))
            && Freeze(session, administrator, "service", date, ServiceReportText.Subject(date, status), ServiceReportText.Of(date, status), NoticeReason.ServiceReportDue);
    }

    private bool Freeze(StoreSession session, Administrator administrator, string kind, LocalDate date, string subject, string text, NoticeReason reason)
    {
        var notice = new Notice(Key(administrator, kind, date), administrator.Id, date, subject, text, ServiceReportText.Html(subject, text), reason) { Decided = now };
        return session.Notices.Add(notice, session.Alerts.Changes.LastPosition(), Ways(administrator, kind));
    }

    /// <summary>That mail does not leave is no news by mail, hours later.</summary>
    private List<Storage.Notices.Delivery> Ways(Administrator administrator, string kind)
    {
        List<Storage.Notices.Delivery> ways = [new("log", administrator.Id)];
        if (configuration.Mail is not null && administrator.Mail is { } address && kind != $"trouble-{MailTrouble}")
        {
            ways.Add(new Storage.Notices.Delivery(MailChannel.ChannelName, address));
        }

        return ways;
    }

    private static string Key(Administrator administrator, string kind, LocalDate date) => $"{administrator.Id}|{kind}|{date:uuuu-MM-dd}";
}
