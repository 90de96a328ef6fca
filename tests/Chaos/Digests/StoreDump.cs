using System.Globalization;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Chaos.Digests;

/// <summary>All rows of a database as sorted lines, read from a copy after the process ended; what tells of clock, path and number of attempts is left out.</summary>
public static class StoreDump
{
    private static readonly string[] OutsideTables =
        ["schema_version", "config_version", "audit", "derived_state", "evaluation", "inbox_root", "trouble", "service_moment"];

    /// <summary>Moments, file ids, counters.</summary>
    private static readonly string[] OutsideColumns =
    [
        "first_seen", "since", "file_id", "mtime", "latest", "decided", "first_attempt", "next_attempt", "last_error", "marks", "made", "instant", "attempts",
    ];

    private static readonly string[] SideFiles = ["", "-wal"];

    /// <summary>Lines <c>table|column=value|…</c>; a moment of evidence keeps its table's own <c>since</c> out but no date.</summary>
    public static IReadOnlyList<string> Lines(string databasePath)
    {
        var folder = Directory.CreateTempSubdirectory("loadwatch-chaos-copy-");
        try
        {
            foreach (var side in SideFiles.Where(side => File.Exists(databasePath + side)))
            {
                File.Copy(databasePath + side, Path.Combine(folder.FullName, "copy.db" + side));
            }

            using var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = Path.Combine(folder.FullName, "copy.db"), Pooling = false }.ConnectionString);
            connection.Open();
            MustBeSound(connection);
            return [.. Tables(connection).SelectMany(table => Rows(connection, table)).Order(StringComparer.Ordinal)];
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    private static void MustBeSound(SqliteConnection connection)
    {
        var said = string.Join("; ", Column(connection, "PRAGMA integrity_check").Concat(Column(connection, "SELECT \"table\" FROM pragma_foreign_key_check")));
        if (said != "ok")
        {
            throw new ChaosFailureException($"the database is damaged: {said}");
        }
    }

    private static List<string> Tables(SqliteConnection connection) =>
        [.. Column(connection, "SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%'").Except(OutsideTables, StringComparer.Ordinal)];

    private static List<string> Column(SqliteConnection connection, string sql)
    {
        using var command = connection.CreateCommand();
#pragma warning disable CA2100 // The texts stand above.
        command.CommandText = sql;
#pragma warning restore CA2100
        using var reader = command.ExecuteReader();
        var values = new List<string>();
        while (reader.Read())
        {
            values.Add(reader.GetString(0));
        }

        return values;
    }

    private static List<string> Rows(SqliteConnection connection, string table)
    {
        using var command = connection.CreateCommand();
#pragma warning disable CA2100 // A table's name cannot be a parameter.
        command.CommandText = $"SELECT * FROM \"{table}\"";
#pragma warning restore CA2100
        using var reader = command.ExecuteReader();
        var rows = new List<string>();
        while (reader.Read())
        {
            rows.Add(string.Join('|', Enumerable.Range(0, reader.FieldCount)
                .Where(at => !OutsideColumns.Contains(reader.GetName(at), StringComparer.Ordinal))
                .Select(at => $"{reader.GetName(at)}={Text(reader.GetValue(at))}")
                .Prepend(table)));
        }

        return rows;
    }

    private static string Text(object value) => value switch
    {
        DBNull => "",
        byte[] bytes => Convert.ToHexStringLower(bytes),
        double number => number.ToString("R", CultureInfo.InvariantCulture),
        _ => Convert.ToString(value, CultureInfo.InvariantCulture)!.ReplaceLineEndings("\\n"),
    };
}
