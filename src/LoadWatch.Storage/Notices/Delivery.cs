using LoadWatch.Notices;
using NodaTime;

namespace LoadWatch.Storage.Notices;

/// <summary>A way by which a notice goes to somebody.</summary>
/// <param name="Channel">Name of the channel: <c>mail</c>, <c>file</c>.</param>
/// <param name="Recipient">As the channel addresses it.</param>
public sealed record Delivery(string Channel, string Recipient);

/// <summary>A delivery that no channel has confirmed yet.</summary>
/// <param name="Attempts">How often it failed.</param>
/// <param name="LastError">What the channel said last, or null.</param>
public sealed record PendingDelivery(Notice Notice, Delivery Delivery, int Attempts, string? LastError);

/// <summary>What a contact was told last.</summary>
/// <param name="Date">The brief's date.</param>
/// <param name="AlertPosition">The last alert change that it knew of.</param>
public sealed record LastBrief(LocalDate Date, long AlertPosition);
