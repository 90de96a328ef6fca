using LoadWatch.Delivery;
using LoadWatch.Delivery.Page;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;

namespace LoadWatch.Service.Pipeline;

/// <summary>Every contact's page as of now: "not in yet" becomes "in" without waiting for the next brief.</summary>
public sealed class Pages(WorkingConfiguration configuration, Store store, Briefs briefs, SweepReport report)
{
    public void Rewrite()
    {
        foreach (var contact in configuration.Contacts)
        {
            var html = PageRenderer.Render(store.Read(session => briefs.Build(session, contact)));
            var outcome = PageFile.Write(configuration.PagesFolder, contact.Id, html);
            if (outcome.Result == ChannelResult.Delivered)
            {
                report.Pages.Add(Path.Combine(configuration.PagesFolder, $"{contact.Id}.html"));
            }
            else
            {
                report.Undelivered.Add($"page of {contact.Id}: {outcome.Reason}");
            }
        }
    }
}
