using LoadWatch.Delivery.Mail;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Notices;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>What a contact's brief says of notices that did not reach the contact by another way.</summary>
public static class MissedNotices
{
    private static readonly Duration Overdue = Duration.FromDays(1);

    /// <summary>Those of whoever is still told anything; mail of whoever still has an address, else nothing would ever end it.</summary>
    public static IEnumerable<MissedDelivery> All(StoreSession session, WorkingConfiguration configuration)
    {
        var told = configuration.Contacts.Select(contact => contact.Id).Concat(configuration.Administrators.Select(administrator => administrator.Id)).ToHashSet(StringComparer.Ordinal);
        var mailboxes = Mailboxes.Of(configuration);
        return session.Notices.MissedDeliveries().Where(missed => told.Contains(missed.Contact) && (missed.Channel != MailChannel.ChannelName || mailboxes.Contains(missed.Contact)));
    }

    /// <summary>Those given up, and those that have been tried for a day or longer. A way that the contact no longer has is left out.</summary>
    public static IEnumerable<BriefLine> Lines(StoreSession session, Contact contact, IReadOnlyList<Storage.Notices.Delivery> ways, Instant now) =>
        session.Notices.MissedDeliveries()
            .Where(missed => missed.Contact == contact.Id && ways.Any(way => way.Channel == missed.Channel))
            .Where(missed => missed.State != DeliveryState.Pending || now - missed.FirstAttempt >= Overdue)
            .Select(missed => new BriefLine(Subject(missed.Channel, contact.Name), Sentence(missed), OfDelivery: true));

    /// <summary><c>not delivered since Sunday 1 March 2026: the server refused the recipient</c></summary>
    public static string Sentence(MissedDelivery missed)
    {
        var end = missed.State switch
        {
            DeliveryState.Expired => ", given up after five days",
            DeliveryState.Failed => ", refused for good",
            DeliveryState.Withdrawn => ", withdrawn",
            _ => ", still tried",
        };
        return $"not delivered since {BriefText.DateInWords(missed.Date)}{end}: {missed.Error}";
    }

    /// <summary><c>Mail to Ada</c></summary>
    public static string Subject(string channel, string name) => $"{char.ToUpperInvariant(channel[0])}{channel[1..]} to {name}";
}
