using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Health;

/// <summary>The catalogue of log events: 1xxx arrivals, 4xxx findings and alerts, 5xxx notices, 9xxx the service itself. No names, no values (I-12).</summary>
public static partial class LogMessages
{
    [LoggerMessage(EventId = 1001, EventName = "SweepDone", Level = LogLevel.Information, Message = "Arrivals settled: {Stored} stored, {Aside} aside, {Held} held, {Refused} refused; {AlertChanges} alert changes, {Notices} briefs decided")]
    public static partial void SweepDone(ILogger logger, int stored, int aside, int held, int refused, int alertChanges, int notices);

    [LoggerMessage(EventId = 1901, EventName = "InboxMissing", Level = LogLevel.Warning, Message = "The inbox {Inbox} is not available: {Reason}")]
    public static partial void InboxMissing(ILogger logger, string inbox, string reason);

    [LoggerMessage(EventId = 1902, EventName = "WatchingFailed", Level = LogLevel.Information, Message = "Folder events are not to be had, the periodic scan finds new files: {Reason}")]
    public static partial void WatchingFailed(ILogger logger, string reason);

    [LoggerMessage(EventId = 1903, EventName = "InboxBack", Level = LogLevel.Information, Message = "The inbox {Inbox} is available again")]
    public static partial void InboxBack(ILogger logger, string inbox);

    [LoggerMessage(EventId = 1904, EventName = "InboxReplaced", Level = LogLevel.Warning, Message = "The inbox {Inbox} is another folder than before; what lies in it is taken in")]
    public static partial void InboxReplaced(ILogger logger, string inbox);

    [LoggerMessage(EventId = 5901, EventName = "DeliveryFailed", Level = LogLevel.Warning, Message = "A notice was not delivered and is tried again: {Delivery}")]
    public static partial void DeliveryFailed(ILogger logger, string delivery);

    [LoggerMessage(EventId = 5902, EventName = "DeliveryGivenUp", Level = LogLevel.Error, Message = "A notice was not delivered and is not tried again: {Delivery}")]
    public static partial void DeliveryGivenUp(ILogger logger, string delivery);

    [LoggerMessage(EventId = 5903, EventName = "PicturesMissing", Level = LogLevel.Warning, Message = "Briefs have no pictures, their words stand alone: the drawing library cannot be loaded: {Reason}")]
    public static partial void PicturesMissing(ILogger logger, string reason);

    [LoggerMessage(EventId = 9001, EventName = "ServiceStarted", Level = LogLevel.Information, Message = "LoadWatch {Version} started: {People} people, {Inboxes} inboxes, {Contacts} contacts, time zone data {TzData}")]
    public static partial void ServiceStarted(ILogger logger, string version, int people, int inboxes, int contacts, string tzData);

    [LoggerMessage(EventId = 9002, EventName = "StillAtWork", Level = LogLevel.Information, Message = "Daily sign of life: {Sweeps} sweeps ended well since the start, the last at {LastDone}; {Troubles} troubles stand")]
    public static partial void StillAtWork(ILogger logger, int sweeps, string? lastDone, int troubles);

    [LoggerMessage(EventId = 9003, EventName = "SweepsRecovered", Level = LogLevel.Information, Message = "Sweeps end well again, after {Failures} that failed")]
    public static partial void SweepsRecovered(ILogger logger, int failures);

    [LoggerMessage(EventId = 9101, EventName = "ConfigurationRefused", Level = LogLevel.Error, Message = "The configuration has {Faults} faults; the last good one stays in force. loadwatch check names them")]
    public static partial void ConfigurationRefused(ILogger logger, int faults);

    [LoggerMessage(EventId = 9102, EventName = "ClockJumped", Level = LogLevel.Warning, Message = "The clock of this machine was set by {Seconds} seconds, or the machine slept")]
    public static partial void ClockJumped(ILogger logger, long seconds);

    [LoggerMessage(EventId = 9103, EventName = "ClockBehind", Level = LogLevel.Error, Message = "{Fault}")]
    public static partial void ClockBehind(ILogger logger, string fault);

    [LoggerMessage(EventId = 9104, EventName = "DatabaseBusy", Level = LogLevel.Warning, Message = "Another program holds the database; the next sweep tries again")]
    public static partial void DatabaseBusy(ILogger logger);

    [LoggerMessage(EventId = 9105, EventName = "StatusFailed", Level = LogLevel.Warning, Message = "The status could not be put together; the next one tries again")]
    public static partial void StatusFailed(ILogger logger, Exception exception);

    [LoggerMessage(EventId = 9106, EventName = "NotTold", Level = LogLevel.Warning, Message = "What stands wrong could not be told by notice: {Reason}")]
    public static partial void NotTold(ILogger logger, string reason);

    [LoggerMessage(EventId = 9901, EventName = "SweepFailed", Level = LogLevel.Error, Message = "A sweep failed; the next one tries again")]
    public static partial void SweepFailed(ILogger logger, Exception exception);

    [LoggerMessage(EventId = 9903, EventName = "WorkStalled", Level = LogLevel.Critical, Message = "The loop {Loop} has not got on for {Seconds} seconds; the watchdog is told no more, and systemd starts the service anew")]
    public static partial void WorkStalled(ILogger logger, string loop, int seconds);

    [LoggerMessage(EventId = 9904, EventName = "DatabaseDamaged", Level = LogLevel.Critical, Message = "The database is damaged; the service stops, and a new start would change nothing")]
    public static partial void DatabaseDamaged(ILogger logger, Exception exception);

    [LoggerMessage(EventId = 9902, EventName = "DurabilityLost", Level = LogLevel.Critical, Message = "The disk failed to keep what was written; the service stops")]
    public static partial void DurabilityLost(ILogger logger, Exception exception);
}
