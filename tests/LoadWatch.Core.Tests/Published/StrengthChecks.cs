using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Published;

/// <summary>Sets: load, repetitions and maximum.</summary>
internal static class StrengthChecks
{
    private static readonly Source Chart = new("National Strength and Conditioning Association, Training load chart", Reading.Read);

    private static readonly Source Zourdos2016 = new(
        "Zourdos et al. 2016, Novel resistance training-specific rating of perceived exertion scale, J Strength Cond Res 30:267-275", Reading.Quoted);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("percent of the maximum that allows 1 to 10 and 12 repetitions", Chart, [100, 95, 93, 90, 87, 85, 83, 80, 77, 75, 70], 1e-6, "%", () =>
            [.. new[] { 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 12 }.Select(repetitions => LoadChart.Share(repetitions)!.Value * 100)]),
        new("repetitions in reserve at hardness 10, 9, 8, 7", Zourdos2016, [0, 1, 2, 3], 0, "", () => [.. new[] { 10, 9, 8, 7 }.Select(Reserve)]),
    ];

    private static double Reserve(int hardness) =>
        SetDemand.Of(Given.Set("squat", 5, null) with { Hardness = hardness }, Given.Date, "p1", AnchorBook.Empty, new()).Demand!.Reserve!.Value;
}
