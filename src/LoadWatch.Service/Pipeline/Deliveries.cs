using LoadWatch.Delivery;
using LoadWatch.Delivery.Log;
using LoadWatch.Delivery.Page;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;

namespace LoadWatch.Service.Pipeline;

/// <summary>Sends what was decided and writes down "sent" only after the channel took it (I-7).</summary>
public sealed class Deliveries(WorkingConfiguration configuration, Store store, Briefs briefs, SweepReport report)
{
    private readonly IReadOnlyDictionary<string, INoticeChannel> channels = new INoticeChannel[]
    {
        new PageFile(configuration.PagesFolder),
        new NoticeFile(configuration.NoticesFolder),
    }.ToDictionary(channel => channel.Name, StringComparer.Ordinal);

    public void Run()
    {
        foreach (var (notice, (channel, recipient), _, _) in store.Read(session => session.Notices.PendingDeliveries()))
        {
            var outcome = channels[channel].Deliver(notice);
            KillPoint.Pass("delivered");
            if (outcome.Result == ChannelResult.Delivered)
            {
                store.Write(session => session.Notices.MarkDelivered(notice.Key, channel, recipient));
            }
            else
            {
                store.Write(session => session.Notices.MarkFailed(notice.Key, channel, recipient, outcome.Reason));
                report.Undelivered.Add($"{channel} of {notice.Key}: {outcome.Reason}");
            }

            report.Advanced();
        }
    }

    /// <summary>Every contact's page as of now: "not in yet" becomes "in" without waiting for the next brief.</summary>
    public void RewritePages()
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

            report.Advanced();
        }
    }
}
