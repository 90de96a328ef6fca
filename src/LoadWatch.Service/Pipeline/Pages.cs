using LoadWatch.Delivery;
using LoadWatch.Delivery.Page;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Every contact's page as of now: "not in yet" becomes "in" without waiting for the next brief.</summary>
public sealed class Pages(WorkingConfiguration configuration, Store store, Briefs briefs, SweepReport report)
{
    /// <summary>A decision is in the database well within this time of the moment that it carries.</summary>
    private static readonly Duration Committed = Duration.FromMinutes(1);

    /// <summary>All pages, or those that staff decided something since, for whose reader a new day began, and that are not there.</summary>
    public void Rewrite(Instant now, bool all)
    {
        var decided = store.Read(session => session.Decisions.All()) is [.., var last] ? last.Made + Committed : Instant.MinValue;
        var stale = configuration.Contacts.Where(contact => all || !IsOfToday(PathOf(contact), contact, now) || WrittenAt(PathOf(contact)) < decided).ToList();
        report.Pages.AddRange(configuration.Contacts.Except(stale).Select(PathOf));
        if (stale.Count > 0)
        {
            store.Read(session => Rewrite(session, stale));
        }
    }

    private string PathOf(Contact contact) => Path.Combine(configuration.PagesFolder, $"{contact.Id}.html");

    private int Rewrite(StoreSession session, List<Contact> stale)
    {
        var people = briefs.People(session);
        foreach (var contact in stale)
        {
            Rewrite(contact, PageRenderer.Render(briefs.Build(session, people, contact)));
        }

        return stale.Count;
    }

    private static bool IsOfToday(string path, Contact contact, Instant now) =>
        File.Exists(path)
        && WrittenAt(path).InZone(contact.Zone).Date == now.InZone(contact.Zone).Date;

    private static Instant WrittenAt(string path) => Instant.FromDateTimeUtc(File.GetLastWriteTimeUtc(path));

    private void Rewrite(Contact contact, string html)
    {
        var outcome = PageFile.Write(configuration.PagesFolder, contact.Id, html);
        if (outcome.Result == ChannelResult.Delivered)
        {
            report.Pages.Add(PathOf(contact));
        }
        else
        {
            report.Undelivered.Add($"page of {contact.Id}: {outcome.Reason}");
        }

        report.Advanced();
    }
}
