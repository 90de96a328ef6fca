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
    /// <summary>All pages, or those for whose reader a new day began and those that are not there.</summary>
    public void Rewrite(Instant now, bool all)
    {
        foreach (var contact in configuration.Contacts)
        {
            var path = Path.Combine(configuration.PagesFolder, $"{contact.Id}.html");
            if (all || !IsOfToday(path, contact, now))
            {
                Rewrite(contact, path);
            }
            else
            {
                report.Pages.Add(path);
            }
        }
    }

    private static bool IsOfToday(string path, Contact contact, Instant now) =>
        File.Exists(path)
        && Instant.FromDateTimeUtc(File.GetLastWriteTimeUtc(path)).InZone(contact.Zone).Date == now.InZone(contact.Zone).Date;

    private void Rewrite(Contact contact, string path)
    {
        var outcome = PageFile.Write(configuration.PagesFolder, contact.Id, PageRenderer.Render(store.Read(session => briefs.Build(session, contact))));
        if (outcome.Result == ChannelResult.Delivered)
        {
            report.Pages.Add(path);
        }
        else
        {
            report.Undelivered.Add($"page of {contact.Id}: {outcome.Reason}");
        }

        report.Advanced();
    }
}
