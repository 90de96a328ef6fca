using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Health;

/// <summary>Judges a status: what is wrong, the graver things first. Pure.</summary>
public static class ServiceTroubles
{
    // All of these are choices.
    private const long Megabyte = 1024 * 1024;
    private const long LargestLog = 256 * Megabyte;
    private const long ScarceBytes = 1024 * Megabyte;
    private const long FullBytes = 200 * Megabyte;
    private static readonly Duration MailMayTake = Duration.FromHours(1);
    private static readonly Duration WaitingMayTake = Duration.FromHours(1);
    private static readonly Duration BehindMayTake = Duration.FromHours(1);
    private static readonly Duration BehindForLong = Duration.FromDays(1);
    private static readonly Duration FailingForLong = Duration.FromMinutes(10);
    private static readonly Duration ClockMayTake = Duration.FromMinutes(10);
    private static readonly Duration AwayMayTake = Duration.FromMinutes(10);

    public static IReadOnlyList<Trouble> Of(ServiceStatus status, Instant now) =>
        [.. All(status, now).OfType<Trouble>().OrderByDescending(trouble => trouble.Critical)];

    /// <summary>How long ago a moment of a status is; null where it is unknown.</summary>
    public static Duration? Age(string? moment, Instant now) =>
        moment is not null && InstantPattern.ExtendedIso.Parse(moment) is { Success: true } parsed ? now - parsed.Value : null;

    private static IEnumerable<Trouble?> All(ServiceStatus status, Instant now) =>
    [
        Failing(status, now),
        Clock(status, now),
        .. status.Inboxes.Where(inbox => inbox.Away is not null).Select(inbox => Away(inbox, now)),
        Mail(status, now),
        Disk(status),
        Behind(status, now),
        status.ConfigurationFault is { } fault ? new Trouble("configuration", false, $"The configuration on disk is not in force, by {PlaceOf(fault)}; loadwatch check tells why.") : null,
        Age(status.OldestWaiting, now) > WaitingMayTake ? new Trouble("arrivals-waiting", false, $"{status.Waiting} arrivals wait to be decoded, the oldest since {status.OldestWaiting}.") : null,
        status.WalBytes > LargestLog
            ? new Trouble("log-of-database", false, $"The database's write-ahead log has grown to {status.WalBytes / Megabyte} MB: some program keeps the database open and reads.")
            : null,
        status.Unreadable > 0 ? new Trouble("unreadable-files", false, $"Files or names that cannot be read: {status.Unreadable}; loadwatch sweep and the brief name them.") : null,
    ];

    /// <summary>File and line of the first fault. Its text may quote a name or a value, and troubles are mailed.</summary>
    private static string PlaceOf(string fault) => string.Join(':', fault.Split('\n')[0].Split(':').Take(2)) is var place && char.IsAsciiDigit(place[^1]) ? place : "a fault";

    private static Trouble? Failing(ServiceStatus status, Instant now) => status.Sweep is { FailingSince: { } since, Failure: var failure }
        ? new Trouble("sweeps-fail", Age(since, now) >= FailingForLong, $"Sweeps have failed since {since}: {failure ?? "the one under way tries again"}.")
        : null;

    /// <summary>A share that is mounted late or away for a moment is nothing to act on yet; a single sweep does not look again, so its one look counts.</summary>
    private static Trouble Away(InboxStatus inbox, Instant now) => new(
        $"inbox-{inbox.Name}",
        inbox.AwaySince is null || Age(inbox.AwaySince, now) >= AwayMayTake,
        $"The inbox \"{inbox.Name}\" is not available: {inbox.Away}.");

    private static Trouble? Clock(ServiceStatus status, Instant now) => status.ClockFault is { } fault
        ? new Trouble("clock-behind", Age(status.ClockFaultSince, now) >= ClockMayTake, fault)
        : null;

    private static Trouble? Mail(ServiceStatus status, Instant now) => (Age(status.MailTriedSince, now) >= MailMayTake, status.Undelivered) switch
    {
        (true, _) => new Trouble("mail-not-leaving", true, $"Mail has not been leaving since {status.MailTriedSince}; deliveries that wait: {status.DeliveriesWaiting}. loadwatch mail-test says why."),
        (_, > 0) => new Trouble("deliveries-missed", false, $"Contacts and channels by which nothing got through at the last try: {status.Undelivered}."),
        _ => null,
    };

    private static Trouble? Disk(ServiceStatus status) => status.DiskFreeBytes switch
    {
        < FullBytes => new Trouble("disk-full", true, $"The disk of the data folder has {status.DiskFreeBytes / Megabyte} MB left."),
        < ScarceBytes => new Trouble("disk-scarce", false, $"The disk of the data folder has {status.DiskFreeBytes / Megabyte} MB left."),
        _ => null,
    };

    private static Trouble? Behind(ServiceStatus status, Instant now) => Age(status.BehindSince, now) is { } age && age >= BehindMayTake
        ? new Trouble("people-behind", age >= BehindForLong, $"Values of {status.PeopleBehind} people have been waiting to be computed anew since {status.BehindSince}.")
        : null;
}
