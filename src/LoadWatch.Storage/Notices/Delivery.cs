using LoadWatch.Notices;
using NodaTime;

namespace LoadWatch.Storage.Notices;

/// <summary>A way by which a notice goes to somebody.</summary>
/// <param name="Channel">Name of the channel: <c>mail</c>, <c>file</c>.</param>
/// <param name="Recipient">As the channel addresses it.</param>
public sealed record Delivery(string Channel, string Recipient);

public enum DeliveryState
{
    /// <summary>Still to be made.</summary>
    Pending,

    /// <summary>The channel has it.</summary>
    Delivered,

    /// <summary>Refused for good.</summary>
    Failed,

    /// <summary>Given up after days of trying.</summary>
    Expired,

    /// <summary>Its recipient was one no longer.</summary>
    Withdrawn,
}

/// <summary>A delivery that no channel has confirmed yet.</summary>
/// <param name="Attempts">How often it failed.</param>
/// <param name="LastError">What the channel said last, or null.</param>
public sealed record PendingDelivery(Notice Notice, Delivery Delivery, int Attempts, string? LastError)
{
    /// <summary>When it was tried first, or null.</summary>
    public Instant? FirstAttempt { get; init; }
}

/// <summary>A notice that did not reach its reader, though it was tried, and after which nothing did by that channel.</summary>
/// <param name="Date">Of the notice.</param>
/// <param name="FirstAttempt">Null for one of before times were kept.</param>
public sealed record MissedDelivery(
    string Contact, string Channel, LocalDate Date, Instant? FirstAttempt, DeliveryState State, string Error);

/// <summary>What a contact was told last.</summary>
/// <param name="Date">The brief's date.</param>
/// <param name="AlertPosition">The last alert change that it knew of.</param>
public sealed record LastBrief(LocalDate Date, long AlertPosition);

/// <summary>Deliveries that are still to be made.</summary>
/// <param name="Oldest">When the notice was decided that has waited longest; null where none waits.</param>
/// <param name="MailTriedSince">
/// When the first of the waiting mails was tried first, of those since which no mail that was decided later got through: one mailbox that takes none is no
/// sign that mail does not leave. Null where there is none.
/// </param>
public sealed record DeliveryBacklog(int Count, Instant? Oldest, Instant? MailTriedSince);
