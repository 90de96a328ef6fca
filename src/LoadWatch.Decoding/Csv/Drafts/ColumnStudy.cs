using System.Text;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>What the cells of one column turn out to be; keeps as little of them as that takes.</summary>
internal sealed class ColumnStudy(string name, int index)
{
    private const int TextsAtMost = 501;

    private readonly Dictionary<byte[], int> texts = new(new ByteContent());

    public string Name => name;

    public int Index => index;

    public NameWords Words { get; } = NameWords.Of(name);

    /// <summary>As the name states it, or a line of units below the names.</summary>
    public string? Unit { get; set; } = NameWords.Of(name).Unit;

    public long Filled { get; private set; }

    public NumberStudy Points { get; } = new('.');

    public NumberStudy Commas { get; } = new(',');

    public NotationStudy Moments { get; } = new(Notation.MomentsOf);

    public NotationStudy Dates { get; } = new(Notation.DatesOf);

    public NotationStudy Times { get; } = new(Notation.TimesOf);

    /// <summary>Different cells; counted up to 501.</summary>
    public int Texts => texts.Count;

    /// <summary>The different cells, each as text, in order of appearance.</summary>
    public IEnumerable<string> Shown => texts.OrderBy(text => text.Value).Select(text => Encoding.UTF8.GetString(text.Key));

    public bool IsNumber => Filled > 0 && (Points.Count == Filled || Commas.Count == Filled);

    /// <summary>Its numbers by the decimal mark that reads them all.</summary>
    public NumberStudy Numbers => Points.Count >= Commas.Count ? Points : Commas;

    public void Take(ReadOnlySpan<byte> cell)
    {
        if (cell.IsEmpty)
        {
            return;
        }

        Filled++;
        Points.Take(cell);
        Commas.Take(cell);
        Moments.Take(cell);
        Dates.Take(cell);
        Times.Take(cell);
        Remember(cell);
    }

    private void Remember(ReadOnlySpan<byte> cell)
    {
        if (texts.Count < TextsAtMost)
        {
            texts.GetAlternateLookup<ReadOnlySpan<byte>>().TryAdd(cell, texts.Count);
        }
    }
}

/// <summary>The cells of a column that are numbers with one decimal mark.</summary>
internal sealed class NumberStudy(char mark)
{
    private double last = double.NegativeInfinity;

    public char Mark => mark;

    public long Count { get; private set; }

    /// <summary>Cells in which the mark stands.</summary>
    public long Marked { get; private set; }

    /// <summary>Of these, those with three digits behind it and one to three before it: they may be thousands.</summary>
    public long LikeThousands { get; private set; }

    public double Lowest { get; private set; } = double.PositiveInfinity;

    public double Highest { get; private set; } = double.NegativeInfinity;

    /// <summary>Whether none is below the one before it.</summary>
    public bool Rises { get; private set; } = true;

    public void Take(ReadOnlySpan<byte> cell)
    {
        if (!StrictNumber.TryRead(cell, mark, out var value))
        {
            return;
        }

        Count++;
        var at = cell.IndexOf((byte)mark);
        Marked += at >= 0 ? 1 : 0;
        LikeThousands += at is >= 1 and <= 3 && cell.Length - at == 4 ? 1 : 0;
        Lowest = Math.Min(Lowest, value);
        Highest = Math.Max(Highest, value);
        Rises &= value >= last;
        last = value;
    }
}
