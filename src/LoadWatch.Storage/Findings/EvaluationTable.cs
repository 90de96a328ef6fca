using NodaTime;

namespace LoadWatch.Storage.Findings;

/// <summary>Table <c>evaluation</c>: which dates were judged, and under which configuration.</summary>
public sealed class EvaluationTable
{
    private const string Insert =
        "INSERT INTO evaluation (scope, date, config_hash) VALUES (@scope, @date, @configHash) ON CONFLICT (scope, date) DO NOTHING";

    private const string SelectLast = "SELECT date FROM evaluation WHERE scope = @scope ORDER BY date DESC LIMIT 1";

    private readonly StoreSession session;

    internal EvaluationTable(StoreSession session) => this.session = session;

    /// <summary>Notes that a date was judged. False, and nothing changed, when it was before.</summary>
    /// <param name="scope">Whose date: the id of a person or a group.</param>
    public bool Add(string scope, LocalDate date, string configHash) => session.Execute(Insert, new { scope, date, configHash }) == 1;

    /// <summary>The latest date judged, or null before any.</summary>
    public LocalDate? LastDate(string scope) => session.Row<Row>(SelectLast, new { scope })?.Date;

    private sealed class Row
    {
        public LocalDate Date { get; init; }
    }
}
