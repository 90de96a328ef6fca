using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Health;

/// <summary>What a process knows of its own sweeps, between them and during one. Safe to use from several threads.</summary>
/// <param name="started">When the service started; null in a process that does one sweep.</param>
public sealed class ServiceRecord(Instant? started)
{
    private readonly Lock guard = new();
    private SweepStatus? sweep;
    private Instant? sweepStarted;
    private Instant? failingSince;
    private Instant? lastDone;
    private Instant? lastMail;
    private Instant? behindSince;
    private Instant? clockFaultSince;
    private string? clockFault;
    private string? lastFailure;
    private string? configurationFault;
    private SweepReport? report;
    private Instant scanned;
    private HashSet<string> away = [];
    private Dictionary<string, Instant> awaySince = [];
    private int failures;
    private bool isWithoutPictures;

    /// <summary>Sweeps that ended well.</summary>
    public int Sweeps { get; private set; }

    /// <summary>True once in the life of the process.</summary>
    public bool IsFirstWithoutPictures()
    {
        lock (guard)
        {
            var isFirst = !isWithoutPictures;
            isWithoutPictures = true;
            return isFirst;
        }
    }

    public void Began(Instant now)
    {
        lock (guard)
        {
            sweepStarted = now;
            sweep = new SweepStatus(Words.Utc(now)!, null, "running", lastFailure, Words.Utc(failingSince));
        }
    }

    /// <returns>How many sweeps failed before this one, in a row.</returns>
    public int Ended(Instant now, SweepReport ended, string? fault)
    {
        lock (guard)
        {
            (report, scanned, configurationFault) = (ended, now, fault);
            awaySince = ended.Looks.Where(look => look.Away is not null).Select(look => look.Inbox.Name)
                .ToDictionary(inbox => inbox, inbox => awaySince.TryGetValue(inbox, out var since) ? since : now, StringComparer.Ordinal);
            (lastDone, failingSince, clockFault, clockFaultSince) = (now, null, null, null);
            lastMail = ended.MailsDelivered > 0 ? now : lastMail;
            behindSince = ended.PeopleBehind > 0 ? behindSince ?? now : null;
            sweep = new SweepStatus(Words.Utc(sweepStarted ?? now)!, Words.Utc(now), "done", null, null);
            Sweeps++;
            var before = failures;
            (failures, lastFailure) = (0, null);
            return before;
        }
    }

    /// <returns>Whether this failure is another one than that of the sweep before.</returns>
    public bool Failed(Instant now, SweepFailure failure)
    {
        lock (guard)
        {
            var isNew = lastFailure != failure.Words;
            lastFailure = failure.Words;
            failingSince ??= sweepStarted ?? now;
            sweep = new SweepStatus(Words.Utc(sweepStarted ?? now)!, Words.Utc(now), "failed", failure.Words, Words.Utc(failingSince));
            failures++;
            return isNew;
        }
    }

    /// <summary>Whether the configuration on disk is faulty in another way than at the last sweep that ended well.</summary>
    public bool IsNewFault(string fault)
    {
        lock (guard)
        {
            return configurationFault != fault;
        }
    }

    /// <summary>A sweep that was not made because the clock is behind.</summary>
    /// <returns>Since when that has been so, by the wrong clock.</returns>
    public Instant ClockIsBehind(Instant now, string fault)
    {
        lock (guard)
        {
            clockFault = fault;
            return clockFaultSince ??= now;
        }
    }

    /// <summary>Inboxes that went away or came back since the last call.</summary>
    public (IReadOnlyList<InboxLook> Gone, IReadOnlyList<string> Back) InboxChanges(IReadOnlyList<InboxLook> looks)
    {
        lock (guard)
        {
            var now = looks.Where(look => look.Away is not null).ToList();
            var changes = (now.Where(look => !away.Contains(look.Inbox.Name)).ToList(), away.Except(now.Select(look => look.Inbox.Name)).Order(StringComparer.Ordinal).ToList());
            away = now.Select(look => look.Inbox.Name).ToHashSet(StringComparer.Ordinal);
            return changes;
        }
    }

    /// <summary>Puts what is known here into a status.</summary>
    public ServiceStatus In(ServiceStatus status)
    {
        lock (guard)
        {
            return status with
            {
                Started = Words.Utc(started),
                Sweep = sweep,
                LastDone = Words.Utc(lastDone),
                Inboxes = [.. (report?.Looks ?? []).Select(look => StatusOf(look))],
                Settling = report?.Settling ?? 0,
                Unreadable = report?.Unreadable.Count ?? 0,
                LastMail = Words.Utc(lastMail),
                Undelivered = report?.Missed ?? 0,
                PeopleBehind = report?.PeopleBehind ?? 0,
                BehindSince = Words.Utc(behindSince),
                ConfigurationFault = configurationFault,
                ClockFault = clockFault,
                ClockFaultSince = Words.Utc(clockFaultSince),
            };
        }
    }

    private InboxStatus StatusOf(InboxLook look) =>
        new(look.Inbox.Name, Words.Utc(scanned)!, look.Root?.FolderId, look.Seen, look.Away, Words.Utc(started is not null && awaySince.TryGetValue(look.Inbox.Name, out var since) ? since : (Instant?)null));
}
