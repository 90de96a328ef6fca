namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Tells the decimal mark from the columns whose cells are all numbers by one of the two.</summary>
internal static class DecimalDraft
{
    public static char Of(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var commas = columns.Where(column => column.Commas.Count == column.Filled && column.Commas.Marked > 0).ToList();
        var points = columns.Where(column => column.Points.Count == column.Filled && column.Points.Marked > 0).ToList();
        var (mark, found) = commas.Count > points.Count ? (',', commas) : ('.', points);
        if (commas.Count > 0 && points.Count > 0)
        {
            notes.Doubt("decimal", $"a comma stands in the numbers of {Names(commas)}, a full stop in those of {Names(points)}; taken: {mark}");
        }
        else if (found.Count == 0)
        {
            notes.Found.Add("decimal mark: all numbers are whole");
        }
        else if (found.TrueForAll(column => LooksLikeThousands(column, mark)))
        {
            notes.Doubt("decimal", $"the marks in {Names(found)} may part thousands, which are never read; taken as the decimal mark: {mark}");
        }
        else
        {
            notes.Found.Add($"decimal mark: {mark}");
        }

        return mark;
    }

    private static bool LooksLikeThousands(ColumnStudy column, char mark)
    {
        var numbers = mark == ',' ? column.Commas : column.Points;
        return numbers.Marked == numbers.LikeThousands;
    }

    private static string Names(IEnumerable<ColumnStudy> columns) => DraftNotes.Quoted(columns.Select(column => column.Name).Take(5));
}
