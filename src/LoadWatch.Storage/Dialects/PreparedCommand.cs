using System.Data;
using System.Data.Common;
using System.Diagnostics.CodeAnalysis;

namespace LoadWatch.Storage.Dialects;

/// <summary>Stands for a prepared command of its connection between the text that it is given and its end.</summary>
internal sealed class PreparedCommand(PreparedConnection connection) : DbCommand
{
    /// <summary>Holds the parameters: who fills them in may change the text meanwhile, as Dapper does to write a list out.</summary>
    private readonly DbCommand given = connection.TakeHolder();

    private DbCommand? inner;
    private bool isDisposed;

    [AllowNull]
    public override string CommandText { get; set; } = "";

    public override int CommandTimeout
    {
        get => given.CommandTimeout;
        set => given.CommandTimeout = value;
    }

    public override CommandType CommandType { get; set; } = CommandType.Text;

    public override bool DesignTimeVisible { get; set; }

    public override UpdateRowSource UpdatedRowSource { get; set; }

    protected override DbConnection? DbConnection
    {
        get => connection;
        set => throw new NotSupportedException("a prepared command belongs to its connection");
    }

    protected override DbParameterCollection DbParameterCollection => given.Parameters;

    protected override DbTransaction? DbTransaction { get; set; }

    public override void Cancel() => inner?.Cancel();

    public override int ExecuteNonQuery() => Ready().ExecuteNonQuery();

    public override object? ExecuteScalar() => Ready().ExecuteScalar();

    public override void Prepare() => Ready().Prepare();

    protected override DbParameter CreateDbParameter() => given.CreateParameter();

    protected override DbDataReader ExecuteDbDataReader(CommandBehavior behavior) => Ready().ExecuteReader(behavior);

    protected override void Dispose(bool disposing)
    {
        if (disposing && !isDisposed)
        {
            isDisposed = true;
            GiveBack();
            connection.GiveBackHolder(given);
        }

        base.Dispose(disposing);
    }

    private DbCommand Ready()
    {
        if (inner?.CommandText != CommandText)
        {
            GiveBack();
            inner = connection.Take(CommandText);
        }

        inner.Parameters.Clear();
        foreach (DbParameter parameter in given.Parameters)
        {
            // The provider looks a bare name up under each of its prefixes, through all names of the statement.
            parameter.ParameterName = parameter.ParameterName is ['@', ..] name ? name : "@" + parameter.ParameterName;
            inner.Parameters.Add(parameter);
        }

        inner.CommandTimeout = given.CommandTimeout;
        inner.Transaction = DbTransaction;
        return inner;
    }

    private void GiveBack()
    {
        if (inner is { } used)
        {
            inner = null;
            connection.GiveBack(used);
        }
    }
}
