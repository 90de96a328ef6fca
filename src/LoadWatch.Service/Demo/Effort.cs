namespace LoadWatch.Service.Demo;

/// <summary>A stretch at one intended power.</summary>
/// <param name="Seconds">1 or more.</param>
/// <param name="OfCriticalPower">Intended power as a fraction of critical power.</param>
internal readonly record struct Effort(int Seconds, double OfCriticalPower);

/// <summary>How endurance sessions are put together.</summary>
internal static class Efforts
{
    private const int WarmUpSeconds = 300;
    private const int CoolDownSeconds = 150;

    /// <summary>Even work well below critical power.</summary>
    public static IReadOnlyList<Effort> Steady(DemoRandom random, double minutes)
    {
        List<Effort> efforts = [new(WarmUpSeconds, 0.55)];
        for (var left = (int)(minutes * 60) - WarmUpSeconds - CoolDownSeconds; left > 0; left -= efforts[^1].Seconds)
            efforts.Add(new(Math.Min(left, random.Whole(150, 300)), random.Between(0.68, 0.78)));

        return [.. efforts, new(CoolDownSeconds, 0.45)];
    }

    /// <summary>Seven to nine efforts of 40 s far above critical power: hard from the first second on.</summary>
    public static IReadOnlyList<Effort> Intervals(DemoRandom random)
    {
        List<Effort> efforts = [new(480, 0.6)];
        for (var effort = random.Whole(7, 9); effort > 0; effort--)
            efforts.AddRange([new(40, random.Between(1.55, 1.7)), new(110, 0.45)]);

        return [.. efforts, new(240, 0.5)];
    }
}
