using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Published;

/// <summary>Sets: load, repetitions and maximum.</summary>
internal static class StrengthChecks
{
    private static readonly Source Chart = new("National Strength and Conditioning Association, Training load chart", Reading.Read);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new(
            "percent of the maximum that allows 1 to 10 and 12 repetitions",
            Chart,
            [100, 95, 93, 90, 87, 85, 83, 80, 77, 75, 70],
            1e-9,
            "%",
            () => [.. new[] { 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 12 }.Select(repetitions => LoadChart.Share(repetitions)!.Value * 100)]),
    ];
}
