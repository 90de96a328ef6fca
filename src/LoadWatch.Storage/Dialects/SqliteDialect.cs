using System.Data.Common;
using System.Globalization;
using Dapper;
using LoadWatch.Storage.Files;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage.Dialects;

/// <summary>SQLite, the embedded default: write-ahead log, every commit synced, one writer.</summary>
public sealed class SqliteDialect : Dialect
{
    /// <summary>Marks the file as ours: <c>LdWt</c> in ASCII.</summary>
    public const int ApplicationId = 0x4C645774;

    // Below it, a bug of the write-ahead log's reset can lose commits.
    private static readonly Version OldestSqlite = new(3, 51, 3);

    private const int NotADatabase = 26;

    // SQLITE_DBCONFIG_NO_CKPT_ON_CLOSE.
    private const int NoCheckpointOnClose = 1006;
    private const int IoErrorOnSync = 10 | (4 << 8);
    private const int IoErrorOnFolderSync = 10 | (5 << 8);

    private readonly string path;
    private readonly string connectionString;

    public SqliteDialect(string path)
    {
        this.path = path;

        // Never created by opening: a deleted database would come back empty. Prepare makes the file.
        // The provider retries a busy database itself until this timeout (seconds); the engine's own setting would come on top.
        connectionString = new SqliteConnectionStringBuilder
        {
            DataSource = path,
            Mode = SqliteOpenMode.ReadWrite,
            DefaultTimeout = 5,
            ForeignKeys = true,
            Pooling = false,
        }.ConnectionString;
    }

    public override string ClaimClause => "";

    public override void Prepare()
    {
        // Made here with its mode; SQLite gives its side files the mode of the database.
        PrivateFiles.OpenOrCreate(path, FileShare.ReadWrite).Dispose();
        using (var bare = new SqliteConnection(connectionString))
        {
            RefuseForeign(bare, mark: true);
        }

        using var connection = OpenWriter();
        new SqliteSchema(connectionString).Upgrade(connection);
    }

    /// <summary>Refuses what <see cref="Prepare"/> would have to change first.</summary>
    /// <exception cref="DatabaseRefusedException">There is no database, or it is not one of this version.</exception>
    public void RefuseUnprepared()
    {
        if (!File.Exists(path))
        {
            throw new DatabaseRefusedException($"there is no {path} yet");
        }

        using var connection = new SqliteConnection(connectionString);
        RefuseForeign(connection, mark: false);
        var had = connection.ExecuteScalar<long>("PRAGMA user_version");
        if (had > SqliteSchema.Scripts.Count)
        {
            throw new NewerDatabaseException(SqliteSchema.NewerThanKnown(path, had));
        }

        if (had < SqliteSchema.Scripts.Count)
        {
            throw new DatabaseRefusedException(
                string.Create(CultureInfo.InvariantCulture, $"{path} has the schema {had}, this program {SqliteSchema.Scripts.Count}: the service upgrades it when it starts"));
        }
    }

    public override DbConnection OpenWriter()
    {
        var connection = Open("PRAGMA query_only=OFF");
        connection.Execute("PRAGMA cache_size=-16000");
        return connection;
    }

    public override DbConnection OpenReader() => Open("PRAGMA query_only=ON");

    public override DbTransaction BeginWrite(DbConnection connection) => Provided(connection).BeginTransaction(deferred: false);

    public override DbTransaction BeginRead(DbConnection connection) => Provided(connection).BeginTransaction(deferred: true);

    public override bool LostDurability(DbException error) =>
        error is SqliteException { SqliteExtendedErrorCode: IoErrorOnSync or IoErrorOnFolderSync };

    public override void RemoveEmptyLog(DbConnection connection) => LeaveLog(Provided(connection), isLeft: false);

    public override bool Checkpoint(DbConnection connection) => connection.ExecuteScalar<long>("PRAGMA wal_checkpoint(TRUNCATE)") == 0;

    public override void CopyTo(DbConnection connection, string path)
    {
        // Made here with its mode; the engine takes an empty file for a new database.
        PrivateFiles.OpenOrCreate(path, FileShare.None).Dispose();
        using var copy = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = path, Mode = SqliteOpenMode.ReadWrite, Pooling = false }.ConnectionString);
        copy.Open();
        Provided(connection).BackupDatabase(copy);
    }

    public override IReadOnlyList<string> Check(DbConnection connection)
    {
        try
        {
            return [.. connection.Query<string>("PRAGMA integrity_check").Where(line => !string.Equals(line, "ok", StringComparison.Ordinal))];
        }
        catch (SqliteException error) when (StoreTroubles.Of(error) == StoreTrouble.Damaged)
        {
            return [error.Message];
        }
    }

    internal static void RefuseOldEngine(string version)
    {
        if (Version.Parse(version) < OldestSqlite)
        {
            throw new DatabaseRefusedException($"SQLite {version} is too old: {OldestSqlite} or later is needed");
        }
    }

    /// <summary>The last to close would else empty the log into the database, swallow an error of that, and remove it.</summary>
    private static void LeaveLog(SqliteConnection connection, bool isLeft) =>
        _ = SQLitePCL.raw.sqlite3_db_config(connection.Handle!, NoCheckpointOnClose, isLeft ? 1 : 0, out _);

    private static SqliteConnection Provided(DbConnection connection) => (SqliteConnection)((PreparedConnection)connection).Inner;

    private PreparedConnection Open(string access)
    {
        var connection = new PreparedConnection(new SqliteConnection(connectionString));
        try
        {
            connection.Open();
            LeaveLog(Provided(connection), isLeft: true);
            connection.Execute("PRAGMA journal_mode=WAL");
            connection.Execute("PRAGMA wal_autocheckpoint=0");
            connection.Execute("PRAGMA synchronous=FULL");
            connection.Execute("PRAGMA trusted_schema=OFF");
            connection.Execute("PRAGMA cell_size_check=ON");
            connection.Execute("PRAGMA temp_store=MEMORY");
            connection.Execute("PRAGMA secure_delete=ON");
            connection.Execute(access);
            return connection;
        }
        catch
        {
            connection.Dispose();
            throw;
        }
    }

    // On a bare connection: even a change of the journal would leave its mark in another program's file.
    private void RefuseForeign(SqliteConnection connection, bool mark)
    {
        try
        {
            connection.Open();
            LeaveLog(connection, isLeft: true);
            RefuseOldEngine(connection.ServerVersion);
            MarkOrRefuse(connection, mark);
        }
        catch (SqliteException error) when (error.SqliteErrorCode == NotADatabase)
        {
            throw new DatabaseRefusedException(
                $"{path} is no SQLite database: left as it is. If it was one of LoadWatch, its beginning is damaged: put it back from a backup (deploy/README.md, Backing up and restoring)");
        }
    }

    // The mark goes into the empty file before any table, so a kill in between leaves no file that looks foreign.
    private void MarkOrRefuse(SqliteConnection connection, bool mark)
    {
        var id = connection.ExecuteScalar<long>("PRAGMA application_id");
        if (id == ApplicationId)
        {
            return;
        }

        if (!mark || id != 0 || connection.ExecuteScalar<long>("SELECT COUNT(*) FROM sqlite_master") > 0)
        {
            throw new DatabaseRefusedException($"{path} is a database of another program (application id {id}): left as it is");
        }

        connection.Execute(string.Create(CultureInfo.InvariantCulture, $"PRAGMA application_id={ApplicationId}"));
    }
}
