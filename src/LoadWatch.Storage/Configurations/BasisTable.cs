namespace LoadWatch.Storage.Configurations;

/// <summary>A part of what derived rows are computed on.</summary>
/// <param name="Scope">Id of the person whom it is about; empty where it is about everybody.</param>
/// <param name="Part">Name of the part.</param>
/// <param name="Value">Equal where the part is.</param>
public sealed record BasisPart(string Scope, string Part, string Value);

/// <summary>Table <c>basis</c>: the configuration and the formulas in the parts that rows depend on, as they were when rows were last asked for.</summary>
public sealed class BasisTable
{
    private const string Select = "SELECT scope, part, value FROM basis ORDER BY scope, part";
    private const string Insert = "INSERT INTO basis (scope, part, value) VALUES (@Scope, @Part, @Value)";
    private const string DeleteAll = "DELETE FROM basis";

    private readonly StoreSession session;

    internal BasisTable(StoreSession session) => this.session = session;

    /// <summary>Sorted by scope and part; empty where nothing is known.</summary>
    public IReadOnlyList<BasisPart> All() => session.Rows<Row>(Select).ConvertAll(row => new BasisPart(row.Scope, row.Part, row.Value));

    /// <summary>Puts these parts in place of all.</summary>
    public void Replace(IEnumerable<BasisPart> parts)
    {
        session.Execute(DeleteAll);
        session.ExecuteEach(Insert, parts);
    }

    private sealed class Row
    {
        public string Scope { get; init; } = "";

        public string Part { get; init; } = "";

        public string Value { get; init; } = "";
    }
}
