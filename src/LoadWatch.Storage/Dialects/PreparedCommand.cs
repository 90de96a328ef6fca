using System.Data;
using System.Data.Common;
using System.Diagnostics.CodeAnalysis;

namespace LoadWatch.Storage.Dialects;

/// <summary>Stands for a prepared command of its connection between the text that it is given and its end.</summary>
internal sealed class PreparedCommand(PreparedConnection connection) : DbCommand
{
    private DbCommand? inner;

    [AllowNull]
    public override string CommandText
    {
        get => inner?.CommandText ?? "";
        set
        {
            if (!string.Equals(value, inner?.CommandText, StringComparison.Ordinal))
            {
                GiveBack();
                inner = connection.Take(value ?? "");
            }
        }
    }

    public override int CommandTimeout
    {
        get => Inner.CommandTimeout;
        set => Inner.CommandTimeout = value;
    }

    public override CommandType CommandType { get; set; } = CommandType.Text;

    public override bool DesignTimeVisible { get; set; }

    public override UpdateRowSource UpdatedRowSource { get; set; }

    protected override DbConnection? DbConnection
    {
        get => connection;
        set => throw new NotSupportedException("a prepared command belongs to its connection");
    }

    protected override DbParameterCollection DbParameterCollection => Inner.Parameters;

    protected override DbTransaction? DbTransaction { get; set; }

    private DbCommand Inner => inner ?? throw new InvalidOperationException("the command has no text yet");

    public override void Cancel() => inner?.Cancel();

    public override int ExecuteNonQuery() => Ready().ExecuteNonQuery();

    public override object? ExecuteScalar() => Ready().ExecuteScalar();

    public override void Prepare() => Ready().Prepare();

    protected override DbParameter CreateDbParameter() => Inner.CreateParameter();

    protected override DbDataReader ExecuteDbDataReader(CommandBehavior behavior) => Ready().ExecuteReader(behavior);

    protected override void Dispose(bool disposing)
    {
        if (disposing)
        {
            GiveBack();
        }

        base.Dispose(disposing);
    }

    private DbCommand Ready()
    {
        Inner.Transaction = DbTransaction;
        return Inner;
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
