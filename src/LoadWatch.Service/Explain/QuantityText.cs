using System.Globalization;
using LoadWatch.Loads;

namespace LoadWatch.Service.Explain;

/// <summary>A quantity of a session in one line.</summary>
internal static class QuantityText
{
    /// <summary><c>minutes_moderate = 15 min (estimated)</c>.</summary>
    public static string Of(Quantity quantity) =>
        string.Create(CultureInfo.InvariantCulture, $"{quantity.Name} = {quantity.Value:0.###} {quantity.Unit}{(quantity.Estimated ? " (estimated)" : "")}");
}
