using System.Data.Common;
using Dapper;
using LoadWatch.Storage.Dialects;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage.Tests.Dialects;

public sealed class SqliteDialectTests : IDisposable
{
    private readonly TemporaryFolder temporary = new();

    private string DatabasePath => temporary.At("loadwatch.db");

    public void Dispose() => temporary.Dispose();

    [Fact]
    public void ADatabaseOfAnotherProgramIsRefusedAndLeftAsItIs()
    {
        Run("CREATE TABLE letters (text TEXT)");
        Run("PRAGMA application_id=42");
        var before = File.ReadAllBytes(DatabasePath);

        var refused = Assert.Throws<DatabaseRefusedException>(new SqliteDialect(DatabasePath).Prepare);

        Assert.Contains("application id 42", refused.Message, StringComparison.Ordinal);
        Assert.Equal(before, File.ReadAllBytes(DatabasePath));
    }

    [Fact]
    public void ADatabaseWithTablesAndWithoutAMarkIsRefused()
    {
        Run("CREATE TABLE letters (text TEXT)");

        Assert.Throws<DatabaseRefusedException>(new SqliteDialect(DatabasePath).Prepare);
    }

    [Fact]
    public void AFileThatIsNoDatabaseIsRefused()
    {
        File.WriteAllText(DatabasePath, new string('x', 5000));

        Assert.Throws<DatabaseRefusedException>(new SqliteDialect(DatabasePath).Prepare);
    }

    [Fact]
    public void ADatabaseOfANewerLoadWatchIsRefused()
    {
        new SqliteDialect(DatabasePath).Prepare();
        Run("PRAGMA user_version=99");

        Assert.Throws<NewerDatabaseException>(new SqliteDialect(DatabasePath).Prepare);
        Assert.Throws<NewerDatabaseException>(new SqliteDialect(DatabasePath).RefuseUnprepared);
    }

    [Fact]
    public void AMarkedFileWithoutTablesIsFilled()
    {
        Run($"PRAGMA application_id={SqliteDialect.ApplicationId}");

        new SqliteDialect(DatabasePath).Prepare();

        Assert.Equal(SqliteSchema.Scripts.Count, Ask<long>("PRAGMA user_version"));
        Assert.Equal(0, Ask<long>("SELECT COUNT(*) FROM arrival"));
    }

    [Fact]
    public void AScriptRunsOnce()
    {
        new SqliteDialect(DatabasePath).Prepare();
        Run("PRAGMA user_version=0");

        new SqliteDialect(DatabasePath).Prepare();

        Assert.Equal(SqliteSchema.Scripts.Count, Ask<long>("SELECT COUNT(*) FROM schema_version"));
    }

    [Theory]
    [InlineData("3.40.1", true)]
    [InlineData("3.51.2", true)]
    [InlineData("3.51.3", false)]
    [InlineData("3.100.0", false)]
    public void AnOldSqliteIsRefused(string version, bool refused)
    {
        var thrown = Record.Exception(() => SqliteDialect.RefuseOldEngine(version));

        Assert.Equal(refused, thrown is DatabaseRefusedException);
    }

    // The numbers are those of the SQLite manual, page "pragma": synchronous 2 is FULL, temp_store 2 is MEMORY.
    [Theory]
    [InlineData("PRAGMA journal_mode", "wal")]
    [InlineData("PRAGMA synchronous", "2")]
    [InlineData("PRAGMA foreign_keys", "1")]
    [InlineData("PRAGMA trusted_schema", "0")]
    [InlineData("PRAGMA cell_size_check", "1")]
    [InlineData("PRAGMA temp_store", "2")]
    [InlineData("PRAGMA secure_delete", "1")]
    [InlineData("PRAGMA busy_timeout", "0")]
    public void EveryConnectionHasItsSettings(string pragma, string expected)
    {
        var dialect = new SqliteDialect(DatabasePath);
        dialect.Prepare();

        using var writer = dialect.OpenWriter();
        using var reader = dialect.OpenReader();

        Assert.Equal((expected, expected), (AskOn(writer, pragma), AskOn(reader, pragma)));
    }

    /// <summary>The provider's own patience counts, in seconds; the engine's would come on top.</summary>
    [Fact]
    public void ABusyDatabaseIsWaitedForFiveSeconds()
    {
        var dialect = new SqliteDialect(DatabasePath);
        dialect.Prepare();

        using var writer = dialect.OpenWriter();

        Assert.Equal(5, ((SqliteConnection)((PreparedConnection)writer).Inner).DefaultTimeout);
    }

    [Fact]
    public void TheFileIsMarkedAsOursWithItsSchema()
    {
        new SqliteDialect(DatabasePath).Prepare();

        Assert.Equal((0x4C645774, SqliteSchema.Scripts.Count), (Ask<long>("PRAGMA application_id"), Ask<long>("PRAGMA user_version")));
    }

    [Theory]
    [InlineData(1034, true)]
    [InlineData(1290, true)]
    [InlineData(266, false)]
    [InlineData(13, false)]
    public void OnlyAFailedSyncLosesDurability(int code, bool lost)
    {
        // Extended result codes (sqlite.org): IOERR_FSYNC, IOERR_DIR_FSYNC, IOERR_READ, FULL.
        var dialect = new SqliteDialect(DatabasePath);

        Assert.Equal(lost, dialect.LostDurability(new SqliteException("error", code & 0xFF, code)));
    }

    private static string AskOn(DbConnection connection, string pragma) => connection.ExecuteScalar<string>(pragma)!;

    private void Run(string sql)
    {
        using var connection = Open();
        connection.Execute(sql);
    }

    private T Ask<T>(string sql)
    {
        using var connection = Open();
        return connection.ExecuteScalar<T>(sql)!;
    }

    private SqliteConnection Open()
    {
        var connection = new SqliteConnection($"Data Source={DatabasePath};Pooling=False");
        connection.Open();
        return connection;
    }
}
