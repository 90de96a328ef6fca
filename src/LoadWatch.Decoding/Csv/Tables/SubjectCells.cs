using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Tells whom each row is about, as the table writes it.</summary>
internal sealed class SubjectCells(CsvTable table, CsvLayout layout, TableKind kind)
{
    private static readonly CellReading Reading = new TextRole("person").Reading(new CsvField(), FieldRole.Ours);

    private readonly int? person = table.Find(layout.PersonColumn);
    private readonly int? group = table.Find(layout.GroupColumn);

    /// <summary>Null without a problem where the table does not name anybody, or the row is about everybody.</summary>
    public string? Read(CsvRows rows, RowPlace place, out Problem? problem)
    {
        var (named, ofGroup) = (Text(rows, person), Text(rows, group));
        if (named.Length > 0 && ofGroup.Length > 0)
        {
            problem = table.Wrong(rows, group!.Value, "a person and a group in one row");
            return null;
        }

        if ((ofGroup.Length > 0 ? group : person ?? group) is not { } column || (named.Length + ofGroup.Length == 0 && kind.TakesEverybody))
        {
            problem = null;
            return place.Person;
        }

        var read = named.Length + ofGroup.Length == 0 ? CellValue.Wrong(Nobody) : Reading(named + ofGroup);
        problem = read.Reason is { } reason ? table.Wrong(rows, column, reason) : null;
        return read.Value as string;
    }

    private string Nobody => (person, group) switch
    {
        (_, null) => "no person",
        (null, _) => "no group",
        _ => "neither a person nor a group",
    };

    private static string Text(CsvRows rows, int? column) => column is { } index ? rows.Text(index) : "";
}
