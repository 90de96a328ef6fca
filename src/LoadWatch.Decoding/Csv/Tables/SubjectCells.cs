using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Tells whom each row is about, as the table writes it.</summary>
internal sealed class SubjectCells(CsvTable table, CsvLayout layout, TableKind kind)
{
    private readonly TextRole role = new("person");
    private readonly int? person = table.Find(layout.PersonColumn);
    private readonly int? group = table.Find(layout.GroupColumn);

    /// <summary>Null without a problem where the table does not name anybody, or the row is about everybody.</summary>
    public string? Read(CsvRows rows, RowPlace place, out Problem? problem)
    {
        problem = null;
        var filled = Columns().Where(column => rows.Text(column).Length > 0).ToList();
        switch (filled)
        {
            case [] when place.Person is not null || kind.TakesEverybody || !Columns().Any():
                return place.Person;
            case []:
                problem = table.Wrong(rows, Columns().First(), group is null ? "no person" : "neither a person nor a group");
                return null;
            case [var column]:
                var cell = role.Reading(new CsvField(), layout)(rows.Text(column));
                problem = cell.Reason is { } reason ? table.Wrong(rows, column, reason) : null;
                return cell.Value as string;
            default:
                problem = table.Wrong(rows, filled[1], "a person and a group in one row");
                return null;
        }
    }

    private IEnumerable<int> Columns() => new[] { person, group }.OfType<int>();
}
