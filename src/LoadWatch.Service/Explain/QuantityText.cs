using System.Globalization;
using LoadWatch.Loads;

namespace LoadWatch.Service.Explain;

/// <summary>A quantity of a session, with what it rests on where its name does not say it.</summary>
internal static class QuantityText
{
    /// <summary><c>minutes_moderate = 15 min (estimated), 3 METs and more: ...</c></summary>
    public static string Of(Quantity quantity) =>
        string.Create(CultureInfo.InvariantCulture, $"{quantity.Name} = {quantity.Value:0.###} {quantity.Unit}{(quantity.Estimated ? " (estimated)" : "")}{Basis(quantity)}");

    private static string Basis(Quantity quantity) => quantity switch
    {
        { Estimated: false } => "",
        { Name: QuantityNames.MinutesModerate } => ", 3 METs and more by steps a minute (Tudor-Locke 2019, 2020, 2021), else by speed and climb, or by power and body mass (Bushman 2020)",
        { Name: QuantityNames.MinutesVigorous } => ", 6 METs and more, by the same",
        _ => "",
    };
}
