using System.Data.Common;

namespace LoadWatch.Storage.Dialects;

/// <summary>
/// Where databases differ: opening, transactions, claiming, and which errors mean that nothing written can be trusted. Every other statement is
/// shared: it uses TEXT, BIGINT, DOUBLE PRECISION and BLOB, keys made by the application, and <c>ON CONFLICT</c>.
/// </summary>
public abstract class Dialect
{
    /// <summary>Appended to a SELECT that claims waiting arrivals for this transaction; empty where there is one writer anyway.</summary>
    public abstract string ClaimClause { get; }

    /// <summary>Creates or upgrades the schema; refuses what is not a database of LoadWatch.</summary>
    /// <exception cref="DatabaseRefusedException">Not ours, or newer than this program, or the engine is too old.</exception>
    public abstract void Prepare();

    /// <summary>Neither a commit nor closing it empties the log by itself: an error of that would be told to nobody.</summary>
    public abstract DbConnection OpenWriter();

    /// <summary>A connection on which nothing can be written.</summary>
    public abstract DbConnection OpenReader();

    /// <summary>Begins a transaction that holds the right to write from its first moment.</summary>
    public abstract DbTransaction BeginWrite(DbConnection connection);

    /// <summary>Begins a transaction that sees one state of the database throughout.</summary>
    public abstract DbTransaction BeginRead(DbConnection connection);

    /// <summary>Whether an error says that bytes reported as durable may not be.</summary>
    public abstract bool LostDurability(DbException error);

    /// <summary>Brings what the side files hold into the database, and erased content out of them. False when a reader was in the way.</summary>
    public abstract bool Checkpoint(DbConnection connection);

    /// <summary>Lets the last connection remove a log that holds nothing more when it is closed.</summary>
    public abstract void RemoveEmptyLog(DbConnection connection);

    /// <summary>Copies the whole database as it is at one moment, while others write, into a file that must not be there yet.</summary>
    public abstract void CopyTo(DbConnection connection, string path);

    /// <summary>What the engine finds wrong with its own file, in its words; empty when nothing.</summary>
    public abstract IReadOnlyList<string> Check(DbConnection connection);
}

/// <summary>A database that LoadWatch does not work on, and why.</summary>
public class DatabaseRefusedException(string message) : Exception(message);

/// <summary>The database is sound, and of a schema that this program does not know yet: the program is the wrong one.</summary>
public sealed class NewerDatabaseException(string message) : DatabaseRefusedException(message);
