namespace LoadWatch.Loads;

/// <summary>A named number with a unit that a session has.</summary>
/// <param name="Name">Lower-case words joined by underscores; the built-in ones are in <see cref="QuantityNames"/>.</param>
/// <param name="Value">Finite, rounded to 9 significant digits.</param>
/// <param name="Estimated">True when an anchor behind it was estimated by an equation or a population mean.</param>
public sealed record Quantity(string Name, double Value, string Unit, bool Estimated);

/// <summary>Names and units of the quantities that LoadWatch computes itself.</summary>
public static class QuantityNames
{
    /// <summary>Banister's training impulse summed over samples, arbitrary units (AU).</summary>
    public const string BanisterTrimp = "banister_trimp";

    /// <summary>Edwards' summated-zone load, arbitrary units (AU).</summary>
    public const string EdwardsLoad = "edwards_load";

    /// <summary>Timer time, else elapsed time, minutes (min).</summary>
    public const string Minutes = "minutes";

    /// <summary>Distance, metres (m).</summary>
    public const string Distance = "distance";

    /// <summary>Mechanical work, kilojoules (kJ).</summary>
    public const string Work = "work";

    /// <summary>Working sets, count.</summary>
    public const string Sets = "sets";

    /// <summary>Repetitions over all working sets, count.</summary>
    public const string Repetitions = "repetitions";

    /// <summary>Kilograms times repetitions over all working sets, kilograms (kg).</summary>
    public const string Kilograms = "kilograms";

    /// <summary>Every quantity that a group's load may be.</summary>
    public static IReadOnlyList<string> All { get; } = [BanisterTrimp, EdwardsLoad, Minutes, Distance, Work, Sets, Repetitions, Kilograms];
}
