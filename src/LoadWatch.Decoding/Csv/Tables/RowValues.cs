using LoadWatch.Loads;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>What the cells of one row said, by field. Unknown is null.</summary>
internal sealed class RowValues
{
    private readonly Dictionary<string, object> values = new(StringComparer.Ordinal);
    private readonly List<Quantity> quantities = [];

    /// <summary>Sorted by name.</summary>
    public IReadOnlyList<Quantity> Quantities => [.. quantities.OrderBy(quantity => quantity.Name, StringComparer.Ordinal)];

    public void Clear()
    {
        values.Clear();
        quantities.Clear();
    }

    public void Set(string field, object value)
    {
        if (value is Quantity quantity)
        {
            quantities.Add(quantity);
        }
        else
        {
            values[field] = value;
        }
    }

    public string? Text(string field) => values.GetValueOrDefault(field) as string;

    public double? Number(string field) => values.GetValueOrDefault(field) as double?;

    public int? Whole(string field) => Number(field) is { } number ? (int)number : null;

    public LocalTime? Time(string field) => values.GetValueOrDefault(field) as LocalTime?;

    public LocalDate? Date(string field) => values.GetValueOrDefault(field) as LocalDate?;

    public bool IsYes(string field) => Text(field) == YesNo.Yes;

    /// <summary>The value whose word it is; null where unknown.</summary>
    public T? Word<T>(string field)
        where T : struct, Enum => Text(field) is { } word ? Words<T>.Parse(word) : null;
}
