using System.Data.Common;
using LoadWatch.Recordings;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Export;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Health;

/// <summary>Puts the status together: what the process knows, what the database and the disk say now.</summary>
public sealed class Statuses(Workplace workplace, ServiceRecord state)
{
    public static string Version { get; } = typeof(Statuses).Assembly.GetName().Version!.ToString(3);

    /// <summary>Writes the status of now and gives it back.</summary>
    public ServiceStatus Write(Instant now)
    {
        var status = Of(now);
        StatusFile.Write(workplace.Folder.Root, status);
        return status;
    }

    private ServiceStatus Of(Instant now)
    {
        var status = OfDisk(OfStore(state.In(new ServiceStatus
        {
            Version = Version,
            Schema = Store.SchemaVersion,
            Process = Environment.ProcessId,
            Written = Words.Utc(now)!,
            ScanSeconds = (int)workplace.Configuration.ScanEvery.TotalSeconds,
        })));
        return status with { Troubles = ServiceTroubles.Of(status, now) };
    }

    /// <summary>Without them where the database cannot be read just now: the sweep tells of that.</summary>
    private ServiceStatus OfStore(ServiceStatus status)
    {
        try
        {
            return workplace.Store.Read(session => OfStore(session, status));
        }
        catch (DbException)
        {
            return status;
        }
    }

    private static ServiceStatus OfStore(StoreSession session, ServiceStatus status)
    {
        var backlog = session.Notices.Backlog();
        return status with
        {
            Waiting = session.Arrivals.Count(ArrivalState.Waiting),
            Through = status.LastDone is null ? session.Arrivals.CountByState().Where(pair => pair.Key != ArrivalState.Waiting).Sum(pair => pair.Value) : null,
            Held = session.Arrivals.Count(ArrivalState.Held),
            OldestWaiting = Words.Utc(session.Sightings.OldestWaiting()),
            LastArrival = Words.Utc(session.Sightings.Newest()),
            DeliveriesWaiting = backlog.Count,
            OldestDelivery = Words.Utc(backlog.Oldest),
            MailTriedSince = Words.Utc(backlog.MailTriedSince),
        };
    }

    private ServiceStatus OfDisk(ServiceStatus status)
    {
        var (database, log) = (new FileInfo(workplace.Folder.DatabasePath), new FileInfo(workplace.Folder.DatabasePath + "-wal"));
        var written = new[] { database, log }.Where(file => file.Exists).Select(file => (Instant?)Instant.FromDateTimeUtc(file.LastWriteTimeUtc)).Max();
        return status with
        {
            DatabaseBytes = database.Exists ? database.Length : 0,
            WalBytes = log.Exists ? log.Length : 0,
            LastCommit = Words.Utc(written),
            DiskFreeBytes = FreeBytes(),
        };
    }

    private long? FreeBytes()
    {
        try
        {
            return new DriveInfo(workplace.Folder.Root).AvailableFreeSpace;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or ArgumentException)
        {
            return null;
        }
    }
}
