using LoadWatch.Loads;

namespace LoadWatch.Activities;

/// <summary>
/// Gathers the quantities of one session. Whoever comes first tells a quantity; later ones fill what is missing. The recording comes first, since it was
/// measured on the person; then the tables by name of their layout. A value that is not taken is told where it is more than a tenth off, a rating where it
/// is any other.
/// </summary>
internal sealed class QuantityFill
{
    private const double Tenth = 0.1;

    private readonly SortedDictionary<string, (Quantity Quantity, string Teller)> taken = new(StringComparer.Ordinal);
    private readonly Dictionary<string, string> statedBy = new(StringComparer.Ordinal);
    private readonly List<string> remarks = [];

    /// <summary>Sorted by name.</summary>
    public IReadOnlyList<Quantity> Quantities => [.. taken.Values.Select(one => one.Quantity)];

    public IReadOnlyList<string> Remarks => remarks;

    public Quantity? this[string name] => taken.TryGetValue(name, out var found) ? found.Quantity : null;

    /// <summary>Layout by name of those that a table states as they stand.</summary>
    public IReadOnlyDictionary<string, string> StatedBy => statedBy;

    /// <summary>As <see cref="Add"/>, of what a table states rather than what is computed.</summary>
    public void AddStated(IEnumerable<Quantity> quantities, string layout)
    {
        foreach (var quantity in quantities)
        {
            if (!taken.ContainsKey(quantity.Name))
            {
                statedBy.Add(quantity.Name, layout);
            }

            Add([quantity], layout);
        }
    }

    public void Add(IEnumerable<Quantity> quantities, string teller)
    {
        foreach (var quantity in quantities)
        {
            if (!taken.TryAdd(quantity.Name, (quantity, teller)) && IsFarFrom(quantity, taken[quantity.Name].Quantity))
            {
                remarks.Add(JoinWording.Differs(taken[quantity.Name].Quantity, taken[quantity.Name].Teller, quantity, teller));
            }
        }
    }

    private static bool IsFarFrom(Quantity one, Quantity other)
    {
        if (one.Unit != other.Unit || one.Name == QuantityNames.Rating)
        {
            return one.Unit != other.Unit || !one.Value.Equals(other.Value);
        }

        return Math.Abs(one.Value - other.Value) > Tenth * Math.Max(Math.Abs(one.Value), Math.Abs(other.Value));
    }
}
