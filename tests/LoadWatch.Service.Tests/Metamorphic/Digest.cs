using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using System.Text.RegularExpressions;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Rows;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage.Recordings;
using LoadWatch.Storage.Rows;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Service.Tests.Metamorphic;

/// <summary>
/// Everything that a store derived, as text that is equal where the stores are: states of arrivals, every derived table column by column, rows in force, alerts
/// that stand. Left out, since it tells how the contents came and not what they say:
/// names and packing (sightings, containers, the scope under which a row of a table stands; a row is compared as it is in force),
/// moments (since when a row says what it says, when an alert was raised and judged; alerts that may wait as long as files have come late: their findings are compared), and how often days were asked for.
/// </summary>
internal static class Digest
{
    private const string Masked = "\"file\":\"\"";

    private static readonly Dictionary<string, string[]> LeftOut = new(StringComparer.Ordinal)
    {
        ["person_state"] = ["dirty_from", "marks"],
    };

    /// <summary>Rules whose findings rest on recordings that are missing, always or at times (<see cref="RuleRecord.WaitedDays"/>).</summary>
    private static readonly string[] MayWait = ["silence", "stimulus_gap", "stimulus_low", "falling_load", "weekly_jump", "load_ratio"];

    /// <summary>Compared as rows in force instead, or a mark of what is done.</summary>
    private static readonly string[] OtherwiseCompared = ["table_row", "table_version", "derived_state"];

    /// <param name="derived">Names of tables, of <see cref="DerivedTables"/>.</param>
    public static string Of(WorkingFolder folder, IReadOnlyCollection<string> derived) => string.Join('\n',
    [
        "# arrivals", .. Arrivals(folder),
        "# rows in force", .. folder.Rows(),
        "# alerts", .. Standing(folder, alert => !MayWait.Contains(alert.Key.Rule, StringComparer.Ordinal)),
        .. derived.Except(OtherwiseCompared, StringComparer.Ordinal).Order(StringComparer.Ordinal).SelectMany(table => Rows(folder, table).Prepend($"# {table}")),
        "# activities with their tables", MaskFiles(folder.Export("activities")),
    ]);

    /// <summary>The tables that an emptying of all that is derived empties, by trying it; the store has nothing derived left then.</summary>
    public static IReadOnlyList<string> DerivedTables(WorkingFolder folder)
    {
        var before = Filled(folder);
        using (var workplace = Workplace.OpenToWork(folder.ConfigPath))
        {
            workplace.Store.Write(session => session.Derived.Empty());
        }

        return [.. before.Except(Filled(folder), StringComparer.Ordinal)];
    }

    /// <summary>Alerts whose finding holds, without what they say of how late files come, which nights alone can know.</summary>
    public static IEnumerable<string> Standing(WorkingFolder folder, Func<Alert, bool>? which = null) => folder.Read((_, session) => session.Alerts.All())
        .Where(alert => alert.State is AlertState.Unacknowledged or AlertState.Acknowledged && which?.Invoke(alert) != false)
        .Select(alert => $"{alert.Key} {alert.Severity} {Regex.Replace(alert.Text, " Files usually come within [0-9]+ days?\\.$", "", RegexOptions.None, TimeSpan.FromSeconds(5))}")
        .Order(StringComparer.Ordinal);

    /// <summary>The name that is shown for each content that is no archive, by its hash.</summary>
    public static IReadOnlyDictionary<string, string> ShownNames(WorkingFolder folder) => folder.Read((_, session) => Contents(session.Arrivals.All())
        .ToDictionary(arrival => arrival.Sha, arrival => session.Sightings.Of(arrival.Sha)[0].Path, StringComparer.Ordinal));

    private static IEnumerable<string> Arrivals(WorkingFolder folder) =>
        Contents(folder.Arrivals()).Select(arrival => $"{arrival.Sha} {arrival.Kind} {arrival.State} {arrival.Person} {arrival.Size} {arrival.Reason}");

    private static IEnumerable<Arrival> Contents(IEnumerable<Arrival> arrivals) => arrivals.Where(arrival => arrival.Kind is not ("gzip" or "zip"));

    private static string MaskFiles(string lines) =>
        Regex.Replace(lines, "\"file\":\"[^\"]*\"", Masked, RegexOptions.None, TimeSpan.FromSeconds(5));

    private static List<string> Filled(WorkingFolder folder)
    {
        using var connection = Open(folder);
        return [.. Strings(connection, "SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite%'")
            .Where(table => Strings(connection, $"SELECT 'x' FROM {table} LIMIT 1").Count > 0)];
    }

    private static List<string> Rows(WorkingFolder folder, string table)
    {
        using var connection = Open(folder);
        using var command = connection.CreateCommand();
#pragma warning disable CA2100 // The name comes from the database's own list.
        command.CommandText = $"SELECT * FROM {table}";
#pragma warning restore CA2100
        using var reader = command.ExecuteReader();
        var rows = new List<string>();
        while (reader.Read())
        {
            rows.Add(string.Join(' ', Enumerable.Range(0, reader.FieldCount)
                .Where(column => !LeftOut.GetValueOrDefault(table, []).Contains(reader.GetName(column), StringComparer.Ordinal))
                .Select(column => Text(reader.GetValue(column)))));
        }

        rows.Sort(StringComparer.Ordinal);
        return rows;
    }

    private static string Text(object value) => value switch
    {
        byte[] bytes => Convert.ToHexStringLower(SHA256.HashData(bytes))[..16],
        double number => number.ToString("R", CultureInfo.InvariantCulture),
        DBNull => "-",
        _ => Convert.ToString(value, CultureInfo.InvariantCulture)!,
    };

    private static List<string> Strings(SqliteConnection connection, string sql)
    {
        using var command = connection.CreateCommand();
#pragma warning disable CA2100 // Names come from the database's own list.
        command.CommandText = sql;
#pragma warning restore CA2100
        using var reader = command.ExecuteReader();
        var found = new List<string>();
        while (reader.Read())
        {
            found.Add(reader.GetString(0));
        }

        return found;
    }

    private static SqliteConnection Open(WorkingFolder folder)
    {
        var connection = new SqliteConnection(new SqliteConnectionStringBuilder
        {
            DataSource = Path.Combine(folder.Data, "loadwatch.db"), Mode = SqliteOpenMode.ReadOnly, Pooling = false,
        }.ConnectionString);
        connection.Open();
        return connection;
    }
}
