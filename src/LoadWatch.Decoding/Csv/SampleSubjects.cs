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
    private readonly Dictionary<string, SampleSubject> known = new(StringComparer.Ordinal);
    private readonly List<SampleSubject> inOrder = [];
    private SampleSubject? last;

    public IReadOnlyList<SampleSubject> InOrder => inOrder;

    /// <returns>Null with the problem, for a row that belongs to nobody.</returns>
    public SampleSubject? Of(CsvRows rows, out Problem? problem)
    {
        problem = null;
        if (column is not { } index)
        {
            return last ??= Add("", []);
        }

        return Expected(rows[index]) ?? Named(rows, index, out problem);
    }

    /// <summary>Rows stand person by person, or moment by moment with the people always in one order: mostly the row is the last one's, or who came after.</summary>
    private SampleSubject? Expected(ReadOnlySpan<byte> cell)
    {
        if (last is null || cell.IsEmpty)
        {
            return null;
        }

        if (last.Next is { } next && cell.SequenceEqual(next.Cell))
        {
            return last = next;
        }

        return cell.SequenceEqual(last.Cell) ? last : null;
    }

    private SampleSubject? Named(CsvRows rows, int index, out Problem? problem)
    {
        problem = null;
        var name = names.Of(rows);
        if (!known.TryGetValue(name, out var found))
        {
            problem = Complaint(rows, index, name);
            found = problem is null ? Add(name, rows[index].ToArray()) : null;
        }

        if (found is not null)
        {
            if (last is not null)
            {
                last.Next = found;
            }

            last = found;
        }

        return found;
    }

    private Problem? Complaint(CsvRows rows, int index, string name) => name.Length switch
    {
        0 => table.Wrong(rows, index, "no person or device"),
        > LongestCharacters => table.Wrong(rows, index, $"more than {LongestCharacters} characters name no person or device"),
        _ when known.Count == SubjectsAtMost => table.Wrong(rows, index, $"more than {SubjectsAtMost} people in one file"),
        _ => null,
    };

    private SampleSubject Add(string name, byte[] cell)
    {
        var added = new SampleSubject(column is null ? null : name, cell);
        known.Add(name, added);
        inOrder.Add(added);
        return added;
    }
}
