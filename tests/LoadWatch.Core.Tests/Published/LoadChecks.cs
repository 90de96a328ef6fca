using LoadWatch.Alerts;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Tests.Days;

namespace LoadWatch.Tests.Published;

/// <summary>Loads, their trends, and the life of what they raise.</summary>
internal static class LoadChecks
{
    private static readonly Source Banister1991 = new(
        "Banister 1991, Modeling elite athletic performance, in Physiological Testing of the High-Performance Athlete, as secondary pages print it", Reading.Quoted);

    private static readonly Source Windt2018 = new(
        "Windt and Gabbett 2018, Is it all for naught? What does mathematical coupling mean for acute:chronic workload ratios? (title from memory), Br J Sports Med 53:988-990",
        Reading.Read);

    private static readonly Source WindtFromMemory = new("Windt and Gabbett 2018, Br J Sports Med 53:988-990", Reading.FromMemory);

    private static readonly Source Leaflet = new("leaflet of a physiotherapy clinic (watsoniaphysiotherapy.com.au), a secondary source", Reading.Read);

    private static readonly Source Opc = new("OPC Foundation, OPC 10000-9 Alarms and Conditions, Table B.1 (the columns without confirmation)", Reading.Read);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("training impulse of a minute at the maximum, men", Banister1991, [4.37], 5e-3, "AU", () => [AtMaximum(Sex.Male)]),
        new("correlation of a week with the mean of the four weeks it is one of, people who train at random", Windt2018, [0.50], 0.05, "", () => [SpuriousCorrelationTests.Coupled]),
        new("coupled ratio where the uncoupled one is 1.8", WindtFromMemory, [1.5], 1e-6, "", () => [Ratio(1.8)]),
        new("usual week of weeks of 3, 3.5, 3.5, 4 km and of 3.5, 3.5, 4, 4 km", Leaflet, [3.5, 3.75], 1e-6, "km", () => [UsualWeek(3, 3.5, 3.5, 4), UsualWeek(3.5, 3.5, 4, 4)]),
        new(
            "active and acknowledged over events 1 to 8",
            Opc,
            ["yes no", "yes yes", "no yes", "no yes", "yes no", "no no", "no yes", "no yes"],
            () => AlertStates(
                AlertSignal.Raise, AlertSignal.Acknowledge, AlertSignal.Return, null, AlertSignal.Raise, AlertSignal.Return, AlertSignal.Acknowledge, null)),
    ];

    private static double AtMaximum(Sex sex) => BanisterTrimp.Of(Given.Histogram((190, 1)), new HeartRateReserve(50, 190, Estimated: false), sex, new())!.Value;

    private static double Ratio(double uncoupled) =>
        Training.Daily([.. Enumerable.Repeat(100.0, 21), .. Enumerable.Repeat(100 * uncoupled, 7)])[^1].RatioCoupled!.Value;

    private static double UsualWeek(params double[] weeks) => Training.Daily([.. weeks.SelectMany(week => new[] { week, 0, 0, 0, 0, 0, 0 })])[^1].Chronic!.Value;

    private static string[] AlertStates(params AlertSignal?[] signals)
    {
        var (state, found) = (AlertState.Normal, new List<string>());
        foreach (var signal in signals)
        {
            state = signal is { } known ? AlertLife.Next(state, known)!.Value.To : state;
            found.Add($"{Word(AlertLife.IsActive(state))} {Word(AlertLife.IsAcknowledged(state))}");
        }

        return [.. found];
    }

    private static string Word(bool holds) => holds ? "yes" : "no";
}
