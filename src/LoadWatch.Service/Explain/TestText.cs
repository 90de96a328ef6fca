using System.Globalization;
using System.Text;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>The function tests of a date, and of chair stands the power with what it rests on.</summary>
internal static class TestText
{
    public static void Append(StringBuilder text, StoreSession session, TableBasis basis, Person person, LocalDate date)
    {
        foreach (var dated in TestRows.Of(session, basis, person, date, date))
        {
            if (FunctionTests.Of(dated.Test.Test) is { } test && dated.Test is { Outcome: null, Value: { } value })
            {
                text.AppendLine(CultureInfo.InvariantCulture, $"    test {test.Word} = {value:0.###} {test.Unit}");
            }

            if (StandingUp.Of(dated.Test, dated.Body) is { } power)
            {
                text.AppendLine(CultureInfo.InvariantCulture, $"    sit-to-stand power = {Number(power.Watts, "W")}, {Number(power.WattsPerKilogram, "W/kg")}{(power.Missing is { } missing ? $": {missing}" : "")}");
                text.AppendLine(CultureInfo.InvariantCulture, $"        body mass {Number(power.Body.MassKilograms, "kg")}, height {Number(power.Body.HeightMetres, "m")}, seat {Number(power.ChairHeightMetres, "m")}");
                text.AppendLine(CultureInfo.InvariantCulture, $"        {StandingUp.Formula}");
                text.AppendLine(CultureInfo.InvariantCulture, $"        {StandingUp.Source}");
            }
        }
    }

    private static string Number(double? value, string unit) => value is { } known ? $"{known.ToString("0.###", CultureInfo.InvariantCulture)} {unit}" : "unknown";
}
