using NodaTime;

namespace LoadWatch.Storage.Services;

/// <summary>Table <c>trouble</c>: what is wrong with the service itself, from its beginning to its end, so that each is told once.</summary>
public sealed class TroubleTable
{
    private const string SelectAll = "SELECT name, since, sentence FROM trouble ORDER BY name";
    private const string Insert = "INSERT INTO trouble (name, since, sentence) VALUES (@Name, @Since, @Sentence)";
    private const string Delete = "DELETE FROM trouble WHERE name = @name";

    private readonly StoreSession session;

    internal TroubleTable(StoreSession session) => this.session = session;

    /// <summary>What stands, by name.</summary>
    public IReadOnlyList<StandingTrouble> All() => session.Rows<Row>(SelectAll).ConvertAll(row => new StandingTrouble(row.Name, row.Since, row.Sentence));

    public void Begin(StandingTrouble trouble) => session.Execute(Insert, trouble);

    public void End(string name) => session.Execute(Delete, new { name });

    private sealed class Row
    {
        public string Name { get; init; } = "";

        public Instant Since { get; init; }

        public string Sentence { get; init; } = "";
    }
}

/// <param name="Name">Stays the same while the trouble lasts.</param>
/// <param name="Sentence">As it was told at its beginning.</param>
public sealed record StandingTrouble(string Name, Instant Since, string Sentence);
