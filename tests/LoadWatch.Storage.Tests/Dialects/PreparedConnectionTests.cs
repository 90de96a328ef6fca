using System.Data.Common;
using Dapper;
using LoadWatch.Storage.Dialects;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage.Tests.Dialects;

public sealed class PreparedConnectionTests : IDisposable
{
    private readonly CountingConnection counting = new();
    private readonly PreparedConnection connection;

    public PreparedConnectionTests()
    {
        connection = new PreparedConnection(counting);
        connection.Open();
        connection.Execute("CREATE TABLE number (value INTEGER PRIMARY KEY, word TEXT)");
    }

    public void Dispose() => connection.Dispose();

    [Fact]
    public void AStatementIsMadeOnceAndTakesOtherValuesEachTime()
    {
        var before = counting.Commands;
        for (var value = 1; value <= 50; value++)
        {
            connection.Execute("INSERT INTO number (value, word) VALUES (@value, @word)", new { value, word = value % 2 == 0 ? "even" : null });
        }

        connection.Execute("INSERT INTO number (value, word) VALUES (@value, @word)", new[] { new { value = 51, word = "a" }, new { value = 52, word = "b" } });

        Assert.Equal(1, counting.Commands - before);
        Assert.Equal(25, connection.ExecuteScalar<int>("SELECT COUNT(*) FROM number WHERE word = 'even'"));
        Assert.Equal(52, connection.ExecuteScalar<int>("SELECT MAX(value) FROM number"));
    }

    [Fact]
    public void AStatementInUseIsMadeASecondTime()
    {
        connection.Execute("INSERT INTO number (value) VALUES (1), (2), (3)");
        var products = new List<long>();
        foreach (var one in connection.Query<long>("SELECT value FROM number ORDER BY value", buffered: false))
        {
            products.AddRange(connection.Query<long>("SELECT value FROM number ORDER BY value").Select(other => one * other));
        }

        Assert.Equal([1, 2, 3, 2, 4, 6, 3, 6, 9], products);
    }

    /// <summary>The text changes while the values are filled in, and those before and behind the list stay.</summary>
    [Fact]
    public void AListOfAnyLengthIsWrittenOutBesideOtherValues()
    {
        const string select = "SELECT value FROM number WHERE value >= @first AND value IN @list AND word = @word ORDER BY value";
        connection.Execute("INSERT INTO number (value, word) VALUES (1, 'a'), (2, 'a'), (3, 'a'), (4, 'b')");
        foreach (var (list, found) in new (int[], long[])[] { ([1, 2, 3, 4], [2, 3]), ([], []), ([2], [2]), ([1, 3], [3]), ([3, 4, 2], [2, 3]) })
        {
            Assert.Equal(found, connection.Query<long>(select, new { first = 2, list, word = "a" }));
        }
    }

    [Fact]
    public void AStatementThatFailedWorksAgain()
    {
        const string insert = "INSERT INTO number (value) VALUES (@value)";
        connection.Execute(insert, new { value = 1 });
        Assert.Throws<SqliteException>(() => connection.Execute(insert, new { value = 1 }));
        connection.Execute(insert, new { value = 2 });
        Assert.Equal(2, connection.ExecuteScalar<int>("SELECT COUNT(*) FROM number"));
    }

    [Fact]
    public void AStatementBelongsToTheTransactionItIsRunIn()
    {
        const string insert = "INSERT INTO number (value) VALUES (@value)";
        using (var first = counting.Inner.BeginTransaction())
        {
            connection.Execute(insert, new { value = 1 }, first);
        }

        using (var second = counting.Inner.BeginTransaction())
        {
            connection.Execute(insert, new { value = 2 }, second);
            second.Commit();
        }

        Assert.Equal([2L], connection.Query<long>("SELECT value FROM number"));
    }

    /// <summary>Counts the commands that are made.</summary>
    private sealed class CountingConnection : DbConnection
    {
        public SqliteConnection Inner { get; } = new("Data Source=:memory:");

        public int Commands { get; private set; }

        [System.Diagnostics.CodeAnalysis.AllowNull]
        public override string ConnectionString
        {
            get => Inner.ConnectionString;
            set => Inner.ConnectionString = value;
        }

        public override string Database => Inner.Database;

        public override string DataSource => Inner.DataSource;

        public override string ServerVersion => Inner.ServerVersion;

        public override System.Data.ConnectionState State => Inner.State;

        public override void ChangeDatabase(string databaseName) => Inner.ChangeDatabase(databaseName);

        public override void Close() => Inner.Close();

        public override void Open() => Inner.Open();

        protected override DbTransaction BeginDbTransaction(System.Data.IsolationLevel isolationLevel) => Inner.BeginTransaction(isolationLevel);

        protected override DbCommand CreateDbCommand()
        {
            Commands++;
            return Inner.CreateCommand();
        }

        protected override void Dispose(bool disposing)
        {
            Inner.Dispose();
            base.Dispose(disposing);
        }
    }
}
