using System.Data.Common;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage;

/// <summary>What a failure of the database comes from, for the one who has to act on it.</summary>
public enum StoreTrouble
{
    /// <summary>Nothing that anybody outside could mend.</summary>
    Other,

    /// <summary>The file is damaged or no database: restore a backup.</summary>
    Damaged,

    /// <summary>Another process holds it: try again.</summary>
    Busy,

    /// <summary>The disk is full, read-only or failing.</summary>
    Disk,
}

/// <summary>Tells one <see cref="StoreTrouble"/> from another.</summary>
public static class StoreTroubles
{
    // Primary result codes of SQLite: sqlite.org, "Result and Error Codes".
    private const int Busy = 5;
    private const int Locked = 6;
    private const int ReadOnly = 8;
    private const int InputOutput = 10;
    private const int Corrupt = 11;
    private const int Full = 13;
    private const int CannotOpen = 14;
    private const int NotADatabase = 26;

    /// <summary>What to do about <see cref="StoreTrouble.Damaged"/>.</summary>
    public const string AdviceOfDamage =
        "the database is damaged. Keep a copy of the data folder as it is, put the database back from a backup (deploy/README.md, Backing up and restoring), "
        + "and let loadwatch verify look at it; what was computed from recordings comes back by loadwatch rebuild";

    public static StoreTrouble Of(DbException error) => (error as SqliteException)?.SqliteErrorCode switch
    {
        Corrupt or NotADatabase => StoreTrouble.Damaged,
        Busy or Locked => StoreTrouble.Busy,
        ReadOnly or InputOutput or Full or CannotOpen => StoreTrouble.Disk,
        _ => StoreTrouble.Other,
    };
}
