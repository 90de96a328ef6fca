using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Health;

/// <summary>The catalogue of log events: 1xxx arrivals, 4xxx findings and alerts, 5xxx notices, 9xxx the service itself. No names, no values (I-12).</summary>
public static partial class LogMessages
{
    [LoggerMessage(EventId = 1001, EventName = "SweepDone", Level = LogLevel.Information, Message = "Arrivals settled: {Stored} stored, {Aside} aside, {Held} held, {Refused} refused; {AlertChanges} alert changes, {Notices} briefs decided")]
    public static partial void SweepDone(ILogger logger, int stored, int aside, int held, int refused, int alertChanges, int notices);

    [LoggerMessage(EventId = 1901, EventName = "InboxMissing", Level = LogLevel.Warning, Message = "The inbox {Inbox} cannot be listed")]
    public static partial void InboxMissing(ILogger logger, string inbox);

    [LoggerMessage(EventId = 1902, EventName = "WatchingFailed", Level = LogLevel.Information, Message = "Folder events are not to be had, the periodic scan finds new files: {Reason}")]
    public static partial void WatchingFailed(ILogger logger, string reason);

    [LoggerMessage(EventId = 5901, EventName = "DeliveryFailed", Level = LogLevel.Warning, Message = "A notice was not delivered and is tried again: {Delivery}")]
    public static partial void DeliveryFailed(ILogger logger, string delivery);

    [LoggerMessage(EventId = 5902, EventName = "DeliveryGivenUp", Level = LogLevel.Error, Message = "A notice was not delivered and is not tried again: {Delivery}")]
    public static partial void DeliveryGivenUp(ILogger logger, string delivery);

    [LoggerMessage(EventId = 9001, EventName = "ServiceStarted", Level = LogLevel.Information, Message = "LoadWatch {Version} started: {People} people, {Inboxes} inboxes, {Contacts} contacts, time zone data {TzData}")]
    public static partial void ServiceStarted(ILogger logger, string version, int people, int inboxes, int contacts, string tzData);

    [LoggerMessage(EventId = 9101, EventName = "ConfigurationRefused", Level = LogLevel.Error, Message = "The configuration has {Faults} faults; the last good one stays in force. loadwatch check names them")]
    public static partial void ConfigurationRefused(ILogger logger, int faults);

    [LoggerMessage(EventId = 9901, EventName = "SweepFailed", Level = LogLevel.Error, Message = "A sweep failed; the next one tries again")]
    public static partial void SweepFailed(ILogger logger, Exception exception);

    [LoggerMessage(EventId = 9903, EventName = "WorkStalled", Level = LogLevel.Critical, Message = "The work has not got on for {Seconds} seconds; the watchdog is told no more, and systemd starts the service anew")]
    public static partial void WorkStalled(ILogger logger, int seconds);

    [LoggerMessage(EventId = 9902, EventName = "DurabilityLost", Level = LogLevel.Critical, Message = "The disk failed to keep what was written; the service stops")]
    public static partial void DurabilityLost(ILogger logger, Exception exception);
}
