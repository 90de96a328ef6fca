namespace LoadWatch.Simulation.Worlds;

/// <summary>How far what is recorded lies from an even life.</summary>
public sealed record Noise
{
    /// <summary>Standard deviation of the logarithm of a session's load.</summary>
    public double LoadDeviation { get; init; } = 0.3;

    /// <summary>The same of a run's distance, part of the former.</summary>
    public double DistanceDeviation { get; init; } = 0.15;

    /// <summary>Share of the days with training on which nothing is recorded.</summary>
    public double Missing { get; init; } = 0.15;

    /// <summary>Share of the recordings whose heart rate is wrong; four of five cannot be used, and say so.</summary>
    public double Faults { get; init; } = 0.05;

    /// <summary>Share of the recordings that come in one to <see cref="LateDays"/> days late.</summary>
    public double Late { get; init; } = 0.1;

    public int LateDays { get; init; } = 3;

    /// <summary>A device is read out once in so many days, each person's on days of their own; 1: every day.</summary>
    public int SyncDays { get; init; } = 1;
}
