using System.Data;
using System.Data.Common;
using System.Diagnostics.CodeAnalysis;

namespace LoadWatch.Storage.Dialects;

/// <summary>
/// A connection that keeps its statements prepared from their first use on: preparing one costs more than the row that it writes. For one thread at a time,
/// as its database is.
/// </summary>
internal sealed class PreparedConnection(DbConnection inner) : DbConnection
{
    /// <summary>Texts are constants but for the lists that Dapper writes out; those must not fill the memory.</summary>
    private const int MostKept = 256;

    private readonly Dictionary<string, DbCommand> idle = new(StringComparer.Ordinal);
    private readonly Stack<DbCommand> holders = [];

    /// <summary>The connection of the provider.</summary>
    public DbConnection Inner => inner;

    [AllowNull]
    public override string ConnectionString
    {
        get => inner.ConnectionString;
        set => inner.ConnectionString = value;
    }

    public override string Database => inner.Database;

    public override string DataSource => inner.DataSource;

    public override string ServerVersion => inner.ServerVersion;

    public override ConnectionState State => inner.State;

    public override void ChangeDatabase(string databaseName) => inner.ChangeDatabase(databaseName);

    public override void Open() => inner.Open();

    public override void Close()
    {
        foreach (var command in idle.Values)
        {
            command.Dispose();
        }

        idle.Clear();
        while (holders.TryPop(out var holder))
        {
            holder.Dispose();
        }

        inner.Close();
    }

    /// <summary>A command of this text, prepared where it was used before. To be given back.</summary>
    internal DbCommand Take(string text)
    {
        if (idle.Remove(text, out var command))
        {
            return command;
        }

        command = inner.CreateCommand();
        command.CommandText = text;
        return command;
    }

    internal void GiveBack(DbCommand command)
    {
        command.Parameters.Clear();
        command.Transaction = null;
        if (idle.Count >= MostKept || !idle.TryAdd(command.CommandText, command))
        {
            command.Dispose();
        }
    }

    /// <summary>A command without a text that holds parameters. To be given back.</summary>
    internal DbCommand TakeHolder() => holders.TryPop(out var holder) ? holder : inner.CreateCommand();

    internal void GiveBackHolder(DbCommand holder)
    {
        holder.Parameters.Clear();
        holders.Push(holder);
    }

    protected override DbTransaction BeginDbTransaction(IsolationLevel isolationLevel) => inner.BeginTransaction(isolationLevel);

    protected override DbCommand CreateDbCommand() => new PreparedCommand(this);

    protected override void Dispose(bool disposing)
    {
        if (disposing)
        {
            Close();
            inner.Dispose();
        }

        base.Dispose(disposing);
    }
}
