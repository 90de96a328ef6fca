using NodaTime;

namespace LoadWatch.Loads;

/// <summary>What a session of a person brings to a conversion.</summary>
/// <param name="Date">The local date that it counts for.</param>
/// <param name="Quantities">Each name at most once.</param>
public sealed record SessionLoads(LocalDate Date, IReadOnlyList<Quantity> Quantities)
{
    /// <summary>The quantity of a name, or null.</summary>
    public Quantity? this[string name] => Find(Quantities, name);

    internal static Quantity? Find(IReadOnlyList<Quantity> quantities, string name)
    {
        foreach (var quantity in quantities)
        {
            if (string.Equals(quantity.Name, name, StringComparison.Ordinal))
            {
                return quantity;
            }
        }

        return null;
    }
}
