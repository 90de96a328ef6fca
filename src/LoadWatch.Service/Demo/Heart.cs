namespace LoadWatch.Service.Demo;

/// <summary>
/// A heart that follows demand with a lag of first order and drifts upward with time. Common practice in teaching, no published source for the numbers.
/// </summary>
/// <param name="restBpm">Resting heart rate.</param>
/// <param name="maxBpm">Maximal heart rate.</param>
internal sealed class Heart(double restBpm, double maxBpm, DemoRandom random)
{
    private const double LagSeconds = 30;
    private const double DriftPerHour = 0.05;

    private readonly double form = 0.008 * random.Normal();
    private double reached = 0.2;
    private double wander;
    private double seconds;

    /// <summary>Heart rate after some more seconds at a demand, whole bpm.</summary>
    /// <param name="demand">Fraction of heart-rate reserve that would be reached in the end, 0 to 1.</param>
    /// <param name="step">Seconds, well below the lag.</param>
    public int After(double demand, int step)
    {
        seconds += step;
        reached += (demand + form + (DriftPerHour * seconds / 3600) - reached) * step / LagSeconds;
        wander += (-0.1 * wander) + (0.4 * random.Normal());
        return (int)Math.Round(Math.Clamp(restBpm + ((maxBpm - restBpm) * Math.Min(reached, 0.98)) + wander, restBpm, maxBpm));
    }
}
