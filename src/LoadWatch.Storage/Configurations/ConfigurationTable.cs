namespace LoadWatch.Storage.Configurations;

/// <summary>Table <c>config_version</c>: every configuration that was ever in force, named by its hash.</summary>
public sealed class ConfigurationTable
{
    // A configuration that comes back becomes the latest again.
    private const string Upsert = """
        INSERT INTO config_version (hash, seq, text)
        VALUES (@hash, (SELECT COALESCE(MAX(seq), 0) + 1 FROM config_version), @text)
        ON CONFLICT (hash) DO UPDATE SET seq = excluded.seq
        """;

    private const string SelectLatest = "SELECT hash FROM config_version ORDER BY seq DESC LIMIT 1";
    private const string SelectText = "SELECT text FROM config_version WHERE hash = @hash";

    private readonly StoreSession session;

    internal ConfigurationTable(StoreSession session) => this.session = session;

    /// <summary>Notes that a configuration is in force now; nothing when it is the latest.</summary>
    public void Remember(string hash, string text)
    {
        if (!string.Equals(LatestHash(), hash, StringComparison.Ordinal))
        {
            session.Execute(Upsert, new { hash, text });
        }
    }

    /// <summary>The configuration in force last, or null before any.</summary>
    public string? LatestHash() => session.Value<string>(SelectLatest);

    public string? Text(string hash) => session.Value<string>(SelectText, new { hash });
}
