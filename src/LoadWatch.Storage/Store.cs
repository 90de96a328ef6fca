using System.Collections.Concurrent;
using System.Data.Common;
using LoadWatch.Storage.Dialects;

namespace LoadWatch.Storage;

/// <summary>The database: one writer at a time, readers beside it. Safe to use from several threads.</summary>
public sealed class Store : IDisposable
{
    /// <summary>
    /// The log is emptied into the database when it has grown by so much. A large import writes the same pages in commit after commit: the fewer times it is
    /// emptied, the fewer of them go to the database twice.
    /// </summary>
    internal const long LogMayGrowBytes = 12L * 1024 * 1024;

    private readonly Dialect dialect;
    private readonly DatabaseFile file;
    private readonly DbConnection? writer;
    private readonly Lock writing = new();
    private readonly ConcurrentBag<DbConnection> idleReaders = [];
    private DurabilityLostException? lost;
    private long emptiedAt = LogMayGrowBytes;
    private bool isSettled;
    private long rowsRead;

    private Store(Dialect dialect, DatabaseFile file, bool toWrite)
    {
        this.dialect = dialect;
        this.file = file;
        writer = toWrite ? dialect.OpenWriter() : null;
    }

    /// <summary>Number of schema scripts that this program knows.</summary>
    public static int SchemaVersion => SqliteSchema.Scripts.Count;

    /// <summary>Opens the database of a data folder, creating or upgrading it first.</summary>
    /// <exception cref="DatabaseRefusedException">Not a database of LoadWatch, or newer than this program, or missing beside an archive that holds originals.</exception>
    public static Store Open(DataFolder folder)
    {
        RefuseMissing(folder);
        var sqlite = new SqliteDialect(folder.DatabasePath);
        sqlite.Prepare();
        return new Store(sqlite, new DatabaseFile(folder.DatabasePath), toWrite: true);
    }

    /// <summary>Opens the database to look at it only, beside a service that writes: creates, upgrades and repairs nothing.</summary>
    /// <exception cref="DatabaseRefusedException">There is none, or it is not one of this version of LoadWatch.</exception>
    public static Store OpenToRead(DataFolder folder)
    {
        var sqlite = new SqliteDialect(folder.DatabasePath);
        sqlite.RefuseUnprepared();
        return new Store(sqlite, new DatabaseFile(folder.DatabasePath), toWrite: false);
    }

    /// <summary>Rows that sessions of this store have read so far: what a piece of work costs, whatever else the machine does.</summary>
    public long RowsRead => Interlocked.Read(ref rowsRead);

    /// <summary>Runs the work in one transaction: all of it is durable when this returns, none of it when it throws (I-4).</summary>
    /// <exception cref="DurabilityLostException">The disk failed to keep what it was given; the store writes no more.</exception>
    public void Write(Action<StoreSession> work) =>
        Write(session =>
        {
            work(session);
            return true;
        });

    /// <inheritdoc cref="Write(Action{StoreSession})"/>
    /// <returns>What the work returned, after the commit: before it, nothing holds.</returns>
    public T Write<T>(Func<StoreSession, T> work)
    {
        lock (writing)
        {
            var result = Trusted(() => Commit(work));
            EmptyGrownLog();
            return result;
        }
    }

    /// <summary>Runs the work on one state of the database. It cannot write.</summary>
    public T Read<T>(Func<StoreSession, T> work)
    {
        var reader = idleReaders.TryTake(out var idle) ? idle : dialect.OpenReader();
        try
        {
            using var transaction = dialect.BeginRead(reader);
            return work(new StoreSession(dialect, reader, transaction, CountRows));
        }
        finally
        {
            idleReaders.Add(reader);
        }
    }

    /// <summary>
    /// Empties the write-ahead log into the database: after an erasure, and when it has grown. False when a reader was in the way: ask again.
    /// </summary>
    public bool Checkpoint()
    {
        lock (writing)
        {
            return Trusted(() => dialect.Checkpoint(Writer));
        }
    }

    /// <summary>
    /// To be called when the work is done: brings what the log holds into the database, so that nothing is left to do when it is closed. An error then would
    /// be told to nobody.
    /// </summary>
    /// <exception cref="DurabilityLostException">The disk failed to keep what it was given.</exception>
    public void Settle() => isSettled = Checkpoint();

    /// <summary>What the engine finds wrong with its own file, in its words; empty when nothing. It reads all of it, and others may write meanwhile.</summary>
    public IReadOnlyList<string> Check()
    {
        using var reader = dialect.OpenReader();
        return dialect.Check(reader);
    }

    /// <summary>Copies the database of this moment, to be opened on its own.</summary>
    public void CopyTo(DataFolder other)
    {
        using var reader = dialect.OpenReader();
        dialect.CopyTo(reader, other.DatabasePath);
    }

    public void Dispose()
    {
        while (idleReaders.TryTake(out var reader))
        {
            reader.Dispose();
        }

        if (writer is not null && isSettled && lost is null)
        {
            dialect.RemoveEmptyLog(writer);
        }

        writer?.Dispose();
    }

    private T Commit<T>(Func<StoreSession, T> work)
    {
        using var transaction = dialect.BeginWrite(Writer);
        var result = work(new StoreSession(dialect, Writer, transaction, CountRows));
        file.Check();
        transaction.Commit();
        isSettled = false;
        file.NoteLog();
        return result;
    }

    /// <summary>The engine would do this by itself within a commit, and keep a failed sync to itself.</summary>
    private void EmptyGrownLog()
    {
        if (file.LogBytes < emptiedAt)
        {
            return;
        }

        // Where a reader is in the way, or the disk is full, what was committed stays in the log, and the log may grow once more.
        emptiedAt = IsEmptied() ? LogMayGrowBytes : file.LogBytes + LogMayGrowBytes;
    }

    private bool IsEmptied()
    {
        try
        {
            return Trusted(() => dialect.Checkpoint(Writer));
        }
        catch (DbException)
        {
            return false;
        }
    }

    /// <summary>Remembers when the disk has failed: from then on nothing is written.</summary>
    private T Trusted<T>(Func<T> work)
    {
        RefuseAfterLoss();
        try
        {
            return work();
        }
        catch (DbException error) when (dialect.LostDurability(error))
        {
            throw lost = new DurabilityLostException(error);
        }
        catch (DurabilityLostException error)
        {
            lost = error;
            throw;
        }
    }

    private DbConnection Writer => writer ?? throw new InvalidOperationException("the store was opened to be read only");

    // An empty database over an archive would take every original for new, and forget who was told what.
    private static void RefuseMissing(DataFolder folder)
    {
        if (new FileInfo(folder.DatabasePath) is { Exists: true, Length: > 0 } || !folder.HoldsOriginals())
        {
            return;
        }

        throw new DatabaseRefusedException(
            $"{folder.DatabasePath} is missing although the archive beside it holds originals: no empty one is made in its place. Put it back from a backup "
            + "(deploy/README.md, Backing up and restoring), or, to begin anew, move the whole folder away: what is in the inboxes comes in again");
    }

    private void CountRows(int rows) => Interlocked.Add(ref rowsRead, rows);

    // After one failed sync the next may claim success over pages that the system has dropped: only a restart and a check tell.
    private void RefuseAfterLoss()
    {
        if (lost is not null)
        {
            throw lost;
        }
    }
}
