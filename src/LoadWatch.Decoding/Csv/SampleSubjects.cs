using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>The people or devices of a file in order of first appearance; one without a name where the layout tells none apart.</summary>
internal sealed class SampleSubjects(CsvTable table, CsvLayout layout)
{
    /// <summary>More is no squad but a column that means something else.</summary>
    private const int SubjectsAtMost = 500;
    private const int LongestCharacters = 100;

    private readonly int? column = table.Find(layout.PersonColumn);
    private readonly CellTexts names = new(table.Find(layout.PersonColumn) ?? 0);
    private readonly Dictionary<string, int> rowsOf = RowCounts(table, layout.PersonColumn);
    private readonly Dictionary<string, SampleSubject> known = new(StringComparer.Ordinal);
    private readonly List<SampleSubject> inOrder = [];

    public IReadOnlyList<SampleSubject> InOrder => inOrder;

    /// <returns>Null with the problem, for a row that belongs to nobody.</returns>
    public SampleSubject? Of(CsvRows rows, out Problem? problem)
    {
        var name = column is null ? "" : names.Of(rows);
        if (known.TryGetValue(name, out var found))
        {
            problem = null;
            return found;
        }

        problem = Complaint(rows, name);
        return problem is null ? Add(name) : null;
    }

    private Problem? Complaint(CsvRows rows, string name) => column is not { } index ? null : name.Length switch
    {
        0 => table.Wrong(rows, index, "no person or device"),
        > LongestCharacters => table.Wrong(rows, index, $"more than {LongestCharacters} characters name no person or device"),
        _ when !rowsOf.ContainsKey(name) => table.Wrong(rows, index, $"more than {SubjectsAtMost} people in one file"),
        _ => null,
    };

    private SampleSubject Add(string name)
    {
        var rows = Math.Min(SampleReading.RowsAtMost, column is null ? table.RowsAtMost : rowsOf[name]);
        var added = new SampleSubject(column is null ? null : name, rows);
        known.Add(name, added);
        inOrder.Add(added);
        return added;
    }

    /// <summary>
    /// Rows by person, of as many as are taken. A look through the file of its own: columns that grow would be copied, and for a moment
    /// there twice.
    /// </summary>
    private static Dictionary<string, int> RowCounts(CsvTable table, string? personColumn)
    {
        var counts = new Dictionary<string, int>(StringComparer.Ordinal);
        if (table.Find(personColumn) is not { } column)
        {
            return counts;
        }

        var texts = new CellTexts(column);
        using var rows = table.Rows();
        while (rows.Next())
        {
            var name = column < rows.CellCount ? texts.Of(rows) : "";
            if (counts.TryGetValue(name, out var count) || counts.Count < SubjectsAtMost)
            {
                counts[name] = count + 1;
            }
        }

        return counts;
    }
}

/// <summary>The rows of one person or device.</summary>
/// <param name="name">As the file writes it; null where it tells none apart.</param>
/// <param name="rowsAtMost">As many rows as there can be of it.</param>
internal sealed class SampleSubject(string? name, int rowsAtMost)
{
    public string? Name => name;

    public ClockTrack Clock { get; } = new();

    public SampleColumns Samples { get; } = new(rowsAtMost);
}
