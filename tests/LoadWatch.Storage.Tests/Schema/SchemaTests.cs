using System.Text;
using Dapper;
using LoadWatch.Storage.Dialects;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage.Tests.Schema;

/// <summary>The schema is a contract: a change of it is a new script and shows here as a difference to read.</summary>
public sealed class SchemaTests(SharedFolder shared) : StoreTest(shared)
{
    private const string Objects = """
        SELECT type, name, sql FROM sqlite_master
        WHERE sql IS NOT NULL AND name NOT LIKE 'sqlite%' AND name <> 'schema_version' ORDER BY type DESC, name
        """;

    [Fact]
    public void TheSchemaIsTheAcceptedOne()
    {
        using var accepted = new StreamReader(typeof(SchemaTests).Assembly.GetManifestResourceStream("accepted-schema.txt")!);

        Assert.Equal(accepted.ReadToEnd(), Describe(), ignoreLineEndingDifferences: true);
    }

    [Fact]
    public void OnlyTypesThatBothDatabasesHaveAreUsed()
    {
        var types = Describe().Split('\n').Where(line => line.StartsWith("  ", StringComparison.Ordinal)).Select(line => line.Split(": ")[1]);

        string[] known = ["TEXT", "BIGINT", "DOUBLE PRECISION", "BLOB"];
        Assert.All(types, type => Assert.Contains(type.Replace(" required", "", StringComparison.Ordinal), known));
    }

    // An error behind the first statement of a command can vanish; a line with a semicolon alone begins a new command.
    [Fact]
    public void EveryCommandOfTheScriptsIsOneStatement()
    {
        Assert.NotEmpty(SqliteSchema.Scripts);
        foreach (var name in SqliteSchema.Scripts)
        {
            using var script = new StreamReader(typeof(Store).Assembly.GetManifestResourceStream(name)!);
            Assert.DoesNotContain(script.ReadToEnd().Split('\n'), line => line.Contains(';', StringComparison.Ordinal) && line.Trim() != ";");
        }
    }

    private string Describe()
    {
        using var connection = new SqliteConnection($"Data Source={Folder.DatabasePath};Pooling=False");
        connection.Open();
        var text = new StringBuilder();
        foreach (var (type, name, sql) in connection.Query<(string Type, string Name, string Sql)>(Objects))
        {
            text.Append(type == "table" ? $"{name} ({Key(connection, name)})" : sql.Trim()).Append('\n');
            foreach (var column in Columns(connection, name))
            {
                text.Append(column);
            }
        }

        return text.ToString();
    }

    private static string Key(SqliteConnection connection, string table) => string.Join(", ", connection.Query<string>(
        "SELECT name FROM pragma_table_info(@table) WHERE pk > 0 ORDER BY pk", new { table }));

    private static IEnumerable<string> Columns(SqliteConnection connection, string table) => connection.Query<string>(
        "SELECT '  ' || name || ': ' || type || CASE WHEN \"notnull\" = 1 THEN ' required' ELSE '' END || char(10) FROM pragma_table_info(@table)",
        new { table });
}
