namespace LoadWatch.Service.Health;

/// <summary>How the service is: the content of <c>status.json</c>. Moments are in UTC; null is unknown or never.</summary>
public sealed record ServiceStatus
{
    public required string Version { get; init; }

    /// <summary>Number of schema scripts that the database has had.</summary>
    public required int Schema { get; init; }

    /// <summary>Process id of the writer.</summary>
    public required int Process { get; init; }

    /// <summary>When the service started; null where a single <c>loadwatch sweep</c> wrote this.</summary>
    public string? Started { get; init; }

    public required string Written { get; init; }

    public required int ScanSeconds { get; init; }

    /// <summary>The sweep under way or the last one; null before the first.</summary>
    public SweepStatus? Sweep { get; init; }

    /// <summary>When a sweep last ended well.</summary>
    public string? LastDone { get; init; }

    public IReadOnlyList<InboxStatus> Inboxes { get; init; } = [];

    /// <summary>Arrivals that are through while the first sweep is under way; null afterwards.</summary>
    public int? Through { get; init; }

    /// <summary>Arrivals that wait to be decoded.</summary>
    public int? Waiting { get; init; }

    /// <summary>When the one came that waits longest.</summary>
    public string? OldestWaiting { get; init; }

    /// <summary>Arrivals that wait for an answer of staff.</summary>
    public int? Held { get; init; }

    /// <summary>Files that may still be growing.</summary>
    public int Settling { get; init; }

    /// <summary>Files that could not be read.</summary>
    public int Unreadable { get; init; }

    /// <summary>When something new was last seen in an inbox.</summary>
    public string? LastArrival { get; init; }

    /// <summary>When the database was last written to.</summary>
    public string? LastCommit { get; init; }

    public int? DeliveriesWaiting { get; init; }

    /// <summary>When the notice was decided that has waited longest.</summary>
    public string? OldestDelivery { get; init; }

    /// <summary>When the first of the waiting mails was tried first, since which none got through to anybody.</summary>
    public string? MailTriedSince { get; init; }

    /// <summary>When a mail was last handed over by this process.</summary>
    public string? LastMail { get; init; }

    /// <summary>Contacts and channels by which nothing got through at the last try.</summary>
    public int Undelivered { get; init; }

    public long DatabaseBytes { get; init; }

    /// <summary>Bytes of the write-ahead log beside it.</summary>
    public long WalBytes { get; init; }

    /// <summary>Bytes free where the data folder lies.</summary>
    public long? DiskFreeBytes { get; init; }

    /// <summary>People whose values are still to be computed anew.</summary>
    public int PeopleBehind { get; init; }

    /// <summary>Since when there have been such people.</summary>
    public string? BehindSince { get; init; }

    /// <summary>Why the configuration on disk is not the one in force.</summary>
    public string? ConfigurationFault { get; init; }

    /// <summary>Why nothing is done until the clock is right.</summary>
    public string? ClockFault { get; init; }

    /// <summary>Since when.</summary>
    public string? ClockFaultSince { get; init; }

    /// <summary>What is wrong, in plain words; empty when all is well.</summary>
    public IReadOnlyList<Trouble> Troubles { get; init; } = [];
}

/// <param name="Ended">Null while it runs.</param>
/// <param name="Result"><c>running</c>, <c>done</c> or <c>failed</c>.</param>
/// <param name="Failure">Why it failed, in plain words.</param>
/// <param name="FailingSince">Start of the first of the failed sweeps in a row.</param>
public sealed record SweepStatus(string Started, string? Ended, string Result, string? Failure, string? FailingSince);

/// <param name="Folder">Device and inode of the folder; null while the inbox is not available.</param>
/// <param name="Files">Files seen.</param>
/// <param name="Away">Why it is not available.</param>
/// <param name="AwaySince">Since when the service has found it so; null where a single <c>loadwatch sweep</c> wrote this, which does not look again.</param>
public sealed record InboxStatus(string Name, string LastScan, string? Folder, int Files, string? Away, string? AwaySince = null);

/// <summary>One thing that is wrong with the service.</summary>
/// <param name="Name">Stays the same while it lasts.</param>
/// <param name="Critical">Somebody has to act; else it is to be known.</param>
/// <param name="Sentence">In plain words; nothing about people.</param>
public sealed record Trouble(string Name, bool Critical, string Sentence);
