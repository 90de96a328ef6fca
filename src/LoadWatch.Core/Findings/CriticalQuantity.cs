using System.Globalization;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Findings;

/// <summary>Critical power or critical speed, with its words.</summary>
public sealed record CriticalQuantity
{
    public static CriticalQuantity Power { get; } = new()
    {
        Channel = Channel.Power,
        Name = AnchorKinds.Of(AnchorKind.CriticalPower).Name,
        Unit = AnchorKinds.Of(AnchorKind.CriticalPower).Unit,
        Line = "work on time, W = W' + CP t",
        Digits = "0",
        ErrorDigits = "0.#",
        ReserveName = "w_prime",
        ReserveWord = "W'",
        ReserveUnit = AnchorKinds.Of(AnchorKind.WPrime).Unit,
    };

    public static CriticalQuantity Speed { get; } = new()
    {
        Channel = Channel.Speed,
        Name = AnchorKinds.Of(AnchorKind.CriticalSpeed).Name,
        Unit = AnchorKinds.Of(AnchorKind.CriticalSpeed).Unit,
        Line = "distance on time, d = D' + CS t",
        Digits = "0.00",
        ErrorDigits = "0.00",
        ReserveName = "d_prime",
        ReserveWord = "D'",
        ReserveUnit = AnchorKinds.Of(AnchorKind.DPrime).Unit,
    };

    public static IReadOnlyList<CriticalQuantity> All { get; } = [Power, Speed];

    /// <summary>Whose bests it is read from.</summary>
    public required Channel Channel { get; init; }

    /// <summary>As its anchor is named: <c>critical_power</c>.</summary>
    public required string Name { get; init; }

    public required string Unit { get; init; }

    /// <summary>The line through the bests, in words and symbols.</summary>
    public required string Line { get; init; }

    public required string ReserveName { get; init; }

    public required string ReserveWord { get; init; }

    public required string ReserveUnit { get; init; }

    /// <summary>Digits that a sentence shows.</summary>
    private string Digits { get; init; } = "";

    private string ErrorDigits { get; init; } = "";

    /// <summary><c>critical power</c>.</summary>
    public string Words => Name.Replace('_', ' ');

    /// <summary>Null for a name that is neither.</summary>
    public static CriticalQuantity? Of(string? name) => All.FirstOrDefault(one => one.Name == name);

    /// <summary><c>250 W</c>, <c>4.12 m/s</c>.</summary>
    internal string Value(double value) => $"{value.ToString(Digits, CultureInfo.InvariantCulture)} {Unit}";

    /// <summary><c>4.5 W</c>, <c>0.08 m/s</c>.</summary>
    internal string Error(double error) => $"{error.ToString(ErrorDigits, CultureInfo.InvariantCulture)} {Unit}";

    /// <summary><c>18000 J</c>, <c>210 m</c>.</summary>
    internal string Reserve(double value) => $"{value.ToString("0", CultureInfo.InvariantCulture)} {ReserveUnit}";
}
