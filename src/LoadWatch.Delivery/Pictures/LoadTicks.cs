using LoadWatch.Notices;

namespace LoadWatch.Delivery.Pictures;

/// <summary>The few round loads that stand beside a picture.</summary>
internal static class LoadTicks
{
    private const int AtMost = 3;

    /// <summary>0 and up to three round steps of 1, 2 or 5 times a power of ten.</summary>
    /// <param name="top">The highest load, above 0.</param>
    public static IReadOnlyList<(double Load, string Label)> UpTo(double top)
    {
        var step = Steps(Math.Pow(10, Math.Floor(Math.Log10(top)) - 1)).First(step => top / step < AtMost + 1);
        return [.. Enumerable.Range(0, (int)(top / step) + 1).Select(count => (count * step, count == 0 ? "0" : BriefNumbers.Load(count * step)))];
    }

    private static IEnumerable<double> Steps(double smallest)
    {
        for (var power = smallest; ; power *= 10)
        {
            yield return power;
            yield return 2 * power;
            yield return 5 * power;
        }
    }
}
