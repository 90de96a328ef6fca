using System.Data.Common;
using System.Globalization;
using System.Reflection;
using Dapper;
using DbUp;

namespace LoadWatch.Storage.Dialects;

/// <summary>The numbered scripts under <c>Schema/</c>, each run once and as a whole. <c>user_version</c> tells how many a file has had.</summary>
internal sealed class SqliteSchema(string connectionString)
{
    private static readonly Assembly Home = typeof(SqliteSchema).Assembly;

    /// <summary>Names of the scripts' resources in the order in which they run.</summary>
    public static IReadOnlyList<string> Scripts { get; } =
        [.. Home.GetManifestResourceNames().Where(IsScript).Order(StringComparer.Ordinal)];

    /// <exception cref="NewerDatabaseException">The file is newer than this program.</exception>
    public void Upgrade(DbConnection connection)
    {
        var had = connection.ExecuteScalar<long>("PRAGMA user_version");
        if (had > Scripts.Count)
        {
            throw new NewerDatabaseException(NewerThanKnown(connection.DataSource, had));
        }

        if (had < Scripts.Count)
        {
            RunScripts();
            connection.Execute(string.Create(CultureInfo.InvariantCulture, $"PRAGMA user_version={Scripts.Count}"));
        }
    }

    internal static string NewerThanKnown(string path, long had) =>
        string.Create(CultureInfo.InvariantCulture, $"{path} was written by a newer LoadWatch (schema {had}, known up to {Scripts.Count}): put that program back, or the backup of before its upgrade");

    private static bool IsScript(string name) =>
        name.Contains(".Schema.", StringComparison.Ordinal) && name.EndsWith(".sql", StringComparison.Ordinal);

    private void RunScripts()
    {
        var result = DeployChanges.To.SqliteDatabase(connectionString)
            .WithScriptsEmbeddedInAssembly(Home, IsScript)
            .WithTransactionPerScript()
            .JournalToSqliteTable("schema_version")
            .LogToNowhere()
            .Build()
            .PerformUpgrade();
        if (!result.Successful)
        {
            throw new InvalidOperationException($"schema script {result.ErrorScript?.Name} failed", result.Error);
        }
    }
}
