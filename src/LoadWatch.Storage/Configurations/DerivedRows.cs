using LoadWatch.Storage.Dialects;

namespace LoadWatch.Storage.Configurations;

/// <summary>All derived tables together, and under which configuration their rows were computed.</summary>
public sealed class DerivedRows
{
    private const string Upsert = "INSERT INTO derived_state (key, value) VALUES (@key, @value) ON CONFLICT (key) DO UPDATE SET value = excluded.value";
    private const string Delete = "DELETE FROM derived_state WHERE key = @key";
    private const string Select = "SELECT value FROM derived_state WHERE key = @key";
    private const string ConfigHashKey = "config_hash";
    private const string RebuildKey = "rebuild";
    private const string RecomputingKey = "recomputing";

    private static readonly string[] DeletesOfPerson =
    [
        "DELETE FROM finding WHERE person = @person",
        "DELETE FROM day WHERE person = @person",
        "DELETE FROM question WHERE person = @person",
        "DELETE FROM todays_room WHERE person = @person",
        "DELETE FROM person_state WHERE person = @person",
        "DELETE FROM anchor_observed WHERE person = @person",
    ];

    private static readonly string[] Deletes =
    [
        "DELETE FROM finding",
        "DELETE FROM day",
        "DELETE FROM todays_room",
        "DELETE FROM person_state",
        "DELETE FROM anchor_observed",
        "DELETE FROM histogram",
        "DELETE FROM best_mean",
        "DELETE FROM activity",
        "DELETE FROM recording",
        "DELETE FROM table_row",
        "DELETE FROM table_version",
        "DELETE FROM table_content",
        "DELETE FROM question",
        "DELETE FROM content_question",
        "DELETE FROM recomputation",
        "DELETE FROM outdated",
        "DELETE FROM basis",
        "DELETE FROM derived_state",
    ];

    private readonly StoreSession session;

    internal DerivedRows(StoreSession session) => this.session = session;

    /// <summary>The configuration under which rows were last asked for, or null when unknown.</summary>
    public string? ConfigHash() => Value(ConfigHashKey);

    /// <summary>Writes nothing where it says so already.</summary>
    public void SetConfigHash(string hash) => Set(ConfigHashKey, hash);

    public RebuildState Rebuild() => Value(RebuildKey) is { } word ? Words<RebuildState>.Parse(word) : RebuildState.None;

    /// <inheritdoc cref="SetConfigHash"/>
    public void SetRebuild(RebuildState state) => Set(RebuildKey, Words<RebuildState>.Of(state));

    /// <summary>Whether outdated contents are being decoded again: true in a new process where the last one ended amid them.</summary>
    public bool IsRecomputing() => Value(RecomputingKey) is not null;

    /// <inheritdoc cref="SetConfigHash"/>
    public void SetRecomputing(bool value)
    {
        if (value)
        {
            Set(RecomputingKey, "yes");
        }
        else if (IsRecomputing())
        {
            session.Execute(Delete, new { key = RecomputingKey });
        }
    }

    /// <summary>Deletes every derived row. What is true stays: arrivals, sightings, decisions, alerts, notices, configurations, evaluations.</summary>
    public void Empty()
    {
        foreach (var delete in Deletes)
        {
            session.Execute(delete);
        }
    }

    /// <summary>Deletes the days, findings, questions and observed reference values of somebody who is watched no more; recordings go with their contents.</summary>
    public void ForgetPerson(string person)
    {
        foreach (var delete in DeletesOfPerson)
        {
            session.Execute(delete, new { person });
        }
    }

    private string? Value(string key) => session.Value<string>(Select, new { key });

    private void Set(string key, string value)
    {
        if (!string.Equals(Value(key), value, StringComparison.Ordinal))
        {
            session.Execute(Upsert, new { key, value });
        }
    }
}
