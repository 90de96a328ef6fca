using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Finds the sport of a file: the layout's word, else the first filled cell of the sport column.</summary>
internal sealed class SportCell(CsvTable table, CsvLayout layout)
{
    private readonly int? column = table.Find(layout.SportColumn);
    private Sport? found = layout.Sport is { } stated ? SportWord.Read(stated) : null;

    public Sport Found => found ?? Sport.Generic;

    /// <returns>A warning where the cell that decides is no word for a sport, or null.</returns>
    public Problem? Take(CsvRows rows)
    {
        if (found is not null || column is not { } index || rows[index].IsEmpty)
        {
            return null;
        }

        var word = SportWord.Read(rows.Text(index));
        found = word ?? Sport.Generic;
        return word is null
            ? table.Wrong(rows, index, "not a word for a sport: taken as generic") with { Severity = ProblemSeverity.Warning }
            : null;
    }
}
