using LoadWatch.Delivery;
using LoadWatch.Delivery.Log;
using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Page;
using LoadWatch.Delivery.Webhook;
using LoadWatch.Notices;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Notices;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Sends what was decided and is due, and writes down "sent" only after the channel took it (I-7).</summary>
public sealed class Deliveries(Store store, IReadOnlyList<INoticeChannel> channels, SweepReport report)
{
    /// <summary>The channels of a configuration, those on disk first: they answer at once.</summary>
    public static IReadOnlyList<INoticeChannel> Channels(WorkingConfiguration configuration)
    {
        List<INoticeChannel> channels = [new PageFile(configuration.PagesFolder), new NoticeFile(configuration.NoticesFolder)];
        if (configuration.Mail is { } mail)
        {
            channels.Add(new MailChannel(mail));
        }

        if (configuration.Webhook is { } webhook)
        {
            channels.Add(new WebhookChannel(webhook, TimeProvider.System));
        }

        return channels;
    }

    public void Run(Instant now)
    {
        var due = store.Read(session => session.Notices.DueDeliveries(now));
        foreach (var pending in due.OrderBy(pending => Place(pending.Delivery.Channel)))
        {
            Settle(pending, Attempt(pending), now);
            report.Advanced();
        }
    }

    /// <summary>In the channels' order; one that is no longer configured comes first, it takes no time.</summary>
    private int Place(string channel) => channels.ToList().FindIndex(known => known.Name == channel);

    private ChannelOutcome Attempt(PendingDelivery pending)
    {
        var channel = channels.FirstOrDefault(channel => channel.Name == pending.Delivery.Channel);
        if (channel is null)
        {
            return ChannelOutcome.TryAgainSlowly($"{pending.Delivery.Channel} is not configured");
        }

        var outcome = channel.Deliver(pending.Notice, pending.Delivery.Recipient);
        KillPoint.Pass("delivered");
        return outcome;
    }

    private void Settle(PendingDelivery pending, ChannelOutcome outcome, Instant now)
    {
        var (key, way) = (pending.Notice.Key, pending.Delivery);
        if (outcome.Result == ChannelResult.Delivered)
        {
            store.Write(session => session.Notices.MarkDelivered(key, way));
            report.MailsDelivered += way.Channel == "mail" ? 1 : 0;
        }
        else if (Next(pending, outcome.Result, now) is { } next)
        {
            store.Write(session => session.Notices.MarkTryAgain(key, way, outcome.Reason, now, next));
            report.Undelivered.Add($"{way.Channel} of {key}: {outcome.Reason}");
        }
        else
        {
            var state = outcome.Result == ChannelResult.Failed ? DeliveryState.Failed : DeliveryState.Expired;
            store.Write(session => session.Notices.MarkGivenUp(key, way, outcome.Reason, state, now));
            report.GivenUp.Add($"{way.Channel} of {key}: {outcome.Reason}");
        }
    }

    /// <summary>Null when it is not tried again.</summary>
    private static Instant? Next(PendingDelivery pending, ChannelResult result, Instant now)
    {
        var trouble = result == ChannelResult.TryAgainSlowly ? DeliveryTrouble.Standing : DeliveryTrouble.Passing;
        return result == ChannelResult.Failed
            ? null
            : DeliverySchedule.Next(pending.FirstAttempt ?? now, now, pending.Attempts + 1, trouble);
    }
}
