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
/// <param name="mailboxes">Mail addresses as configured now, by whose they are: a mail decided for another one is withdrawn.</param>
public sealed class Deliveries(Store store, IReadOnlyList<INoticeChannel> channels, ILookup<string, string> mailboxes, SweepReport report)
{
    private const string Withdrawn = "its reader no longer has the address that it was decided for";

    public Deliveries(Store store, WorkingConfiguration configuration, SweepReport report)
        : this(store, Channels(configuration), Mailboxes.Of(configuration), report)
    {
    }

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
            if (IsWanted(pending))
            {
                Settle(pending, Attempt(pending), now);
            }
            else
            {
                GiveUp(pending, Withdrawn, DeliveryState.Withdrawn, now);
            }

            report.Advanced();
        }
    }

    /// <summary>In the channels' order; one that is no longer configured comes first, it takes no time.</summary>
    private int Place(string channel) => channels.ToList().FindIndex(known => known.Name == channel);

    /// <summary>An address that was mistyped or taken away since gets nothing more. The other channels go by the contact's id.</summary>
    private bool IsWanted(PendingDelivery pending) =>
        pending.Delivery.Channel != MailChannel.ChannelName || mailboxes[pending.Notice.ContactId].Contains(pending.Delivery.Recipient, StringComparer.OrdinalIgnoreCase);

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
            report.MailsDelivered += way.Channel == MailChannel.ChannelName ? 1 : 0;
        }
        else if (Next(pending, outcome.Result, now) is { } next)
        {
            store.Write(session => session.Notices.MarkTryAgain(key, way, outcome.Reason, now, next));
            report.Undelivered.Add($"{way.Channel} of {key}: {outcome.Reason}");
        }
        else
        {
            GiveUp(pending, outcome.Reason, outcome.Result == ChannelResult.Failed ? DeliveryState.Failed : DeliveryState.Expired, now);
        }
    }

    private void GiveUp(PendingDelivery pending, string reason, DeliveryState state, Instant now)
    {
        var (key, way) = (pending.Notice.Key, pending.Delivery);
        store.Write(session => session.Notices.MarkGivenUp(key, way, reason, state, now));
        report.GivenUp.Add($"{way.Channel} of {key}: {reason}");
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
