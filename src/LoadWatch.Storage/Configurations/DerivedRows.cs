namespace LoadWatch.Storage.Configurations;

/// <summary>All derived tables together, and under which configuration their rows were computed.</summary>
public sealed class DerivedRows
{
    private const string Upsert = """
        INSERT INTO derived_state (key, value) VALUES ('config_hash', @hash)
        ON CONFLICT (key) DO UPDATE SET value = excluded.value
        """;

    private const string Select = "SELECT value FROM derived_state WHERE key = 'config_hash'";

    private static readonly string[] Deletes =
    [
        "DELETE FROM finding",
        "DELETE FROM day",
        "DELETE FROM person_state",
        "DELETE FROM histogram",
        "DELETE FROM activity",
        "DELETE FROM recording",
        "DELETE FROM table_row",
        "DELETE FROM table_version",
        "DELETE FROM table_content",
        "DELETE FROM question",
        "DELETE FROM content_question",
        "DELETE FROM recomputation",
        "DELETE FROM derived_state",
    ];

    private readonly StoreSession session;

    internal DerivedRows(StoreSession session) => this.session = session;

    /// <summary>The configuration under which the rows were computed, or null when unknown.</summary>
    public string? ConfigHash() => session.Value<string>(Select);

    public void SetConfigHash(string hash) => session.Execute(Upsert, new { hash });

    /// <summary>Deletes every derived row. What is true stays: arrivals, sightings, decisions, alerts, notices, configurations, evaluations.</summary>
    public void Empty()
    {
        foreach (var delete in Deletes)
        {
            session.Execute(delete);
        }
    }
}
