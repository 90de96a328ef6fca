using LoadWatch.People;
using LoadWatch.Rows;

namespace LoadWatch.Loads;

/// <summary>The power of a chair-stand test (<see cref="SitToStandPower"/>) with what it rests on. Unknown is null.</summary>
/// <param name="Watts">W, above 0.</param>
/// <param name="WattsPerKilogram">W/kg, above 0; body mass is not needed for it.</param>
/// <param name="Body">On the date of the test.</param>
/// <param name="ChairHeightMetres">Height of the seat, m.</param>
/// <param name="Missing">Why a power is unknown, in plain words; null where both are known.</param>
public sealed record StandingUp(double? Watts, double? WattsPerKilogram, BodySize Body, double? ChairHeightMetres, string? Missing)
{
    public const string Formula = "sit-to-stand power: P = 0.9 m g (0.5 h - c) / (0.5 T / n), m body mass, h body height, c height of the seat, n rises in T";

    public const string Source = "Alcazar et al. 2018, The sit-to-stand muscle power test, Exp Gerontol 112:38-43 (five rises); Alcazar et al. 2020, Sci Rep 10:16337 (rises in 30 s)";

    /// <summary>Null for another test, and for one that was not done as described.</summary>
    public static StandingUp? Of(TestRow test, BodySize body)
    {
        if (!SitToStandPower.IsOf(test) || test is not { Outcome: null, Value: not null })
        {
            return null;
        }

        var byMass = body.HeightMetres is { } height ? SitToStandPower.WattsPerKilogram(test, height) : null;
        var watts = body is { MassKilograms: { } mass, HeightMetres: { } tall } ? SitToStandPower.Watts(test, mass, tall) : null;
        return new StandingUp(watts, byMass, body, test.ChairHeightMetres, watts is null ? Lack(test, body) : null);
    }

    private static string Lack(TestRow test, BodySize body)
    {
        var unknown = new[]
        {
            body.MassKilograms is null ? "body mass" : null,
            body.HeightMetres is null ? "body height" : null,
            test.ChairHeightMetres is null ? "the height of the seat" : null,
        }.OfType<string>().ToList();
        return unknown.Count > 0 ? $"{string.Join(" and ", unknown)} {(unknown.Count == 1 ? "is" : "are")} not known"
            : test.Value < 1 ? "there was no rise"
            : "the seat is not lower than half of the body height";
    }
}
