namespace LoadWatch.Decoding.Csv;

/// <summary>The texts of one column, each made once: a file of samples names the same few people in every row.</summary>
internal sealed class CellTexts(int column)
{
    private const int TextsAtMost = 1_000;

    private readonly Dictionary<byte[], string> known = new(new ByteContent());

    public string Of(CsvRows rows)
    {
        var cells = known.GetAlternateLookup<ReadOnlySpan<byte>>();
        if (cells.TryGetValue(rows[column], out var text))
        {
            return text;
        }

        text = rows.Text(column);
        if (known.Count < TextsAtMost)
        {
            cells[rows[column]] = text;
        }

        return text;
    }
}
