using System.Collections.Concurrent;
using System.Data.Common;
using LoadWatch.Storage.Dialects;

namespace LoadWatch.Storage;

/// <summary>The database: one writer at a time, readers beside it. Safe to use from several threads.</summary>
public sealed class Store : IDisposable
{
    private readonly Dialect dialect;
    private readonly DbConnection writer;
    private readonly Lock writing = new();
    private readonly ConcurrentBag<DbConnection> idleReaders = [];
    private DbException? lost;

    private Store(Dialect dialect)
    {
        this.dialect = dialect;
        writer = dialect.OpenWriter();
    }

    /// <summary>Opens the database of a data folder, creating or upgrading it first.</summary>
    /// <exception cref="DatabaseRefusedException">Not a database of LoadWatch, or newer than this program.</exception>
    public static Store Open(DataFolder folder)
    {
        var sqlite = new SqliteDialect(folder.DatabasePath);
        sqlite.Prepare();
        return new Store(sqlite);
    }

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
            RefuseAfterLoss();
            try
            {
                using var transaction = dialect.BeginWrite(writer);
                var result = work(new StoreSession(dialect, writer, transaction));
                transaction.Commit();
                return result;
            }
            catch (DbException error) when (dialect.LostDurability(error))
            {
                lost = error;
                throw new DurabilityLostException(error);
            }
        }
    }

    /// <summary>Runs the work on one state of the database. It cannot write.</summary>
    public T Read<T>(Func<StoreSession, T> work)
    {
        var reader = idleReaders.TryTake(out var idle) ? idle : dialect.OpenReader();
        try
        {
            using var transaction = dialect.BeginRead(reader);
            return work(new StoreSession(dialect, reader, transaction));
        }
        finally
        {
            idleReaders.Add(reader);
        }
    }

    /// <summary>After an erasure: brings what was erased out of the side files too. False when a reader was in the way: ask again.</summary>
    public bool Checkpoint()
    {
        lock (writing)
        {
            RefuseAfterLoss();
            return dialect.Checkpoint(writer);
        }
    }

    /// <summary>What the engine finds wrong with its own file, in its words; empty when nothing.</summary>
    public IReadOnlyList<string> Check()
    {
        lock (writing)
        {
            return dialect.Check(writer);
        }
    }

    public void Dispose()
    {
        while (idleReaders.TryTake(out var reader))
        {
            reader.Dispose();
        }

        writer.Dispose();
    }

    // After one failed sync the next may claim success over pages that the system has dropped: only a restart and a check tell.
    private void RefuseAfterLoss()
    {
        if (lost is not null)
        {
            throw new DurabilityLostException(lost);
        }
    }
}

/// <summary>The system could not make written bytes durable. Stop, check the disk, start again.</summary>
public sealed class DurabilityLostException(Exception cause)
    : Exception("the disk failed to keep what was written: nothing more is written until a restart", cause);
