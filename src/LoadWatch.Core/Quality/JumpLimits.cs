using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>How fast a channel can change.</summary>
/// <param name="PerSecond">Largest change in the channel's unit per second; readings closer than <paramref name="LeastMilliseconds"/> count as that far apart.</param>
/// <param name="MostMilliseconds">Readings further apart say nothing about how fast it changed.</param>
/// <param name="Within">Largest change within <see cref="WindowMilliseconds"/>; infinite where there is no such limit.</param>
/// <param name="LongestMilliseconds">A level that is left and returned from is a spike while it is shorter; a longer one may be the true one.</param>
internal sealed record JumpLimits(double PerSecond, int LeastMilliseconds, int MostMilliseconds, double Within, int LongestMilliseconds)
{
    public const int WindowMilliseconds = 5000;

    /// <summary>The change that is possible however close two readings are.</summary>
    public double Least { get; } = PerSecond * LeastMilliseconds / 1000;

    /// <summary>
    /// Null for channels that are not looked at this way. Assumptions, no published source: nobody gains or loses 8 m/s within a second, not even in a tackle, and
    /// nobody climbs 30 m in one; a distance may grow by 45 m in one.
    /// </summary>
    public static JumpLimits? Of(Channel channel, QualityLimits limits) => channel switch
    {
        Channel.HeartRate => new JumpLimits(limits.HeartRateBpmPerSecond, 1000, 5000, limits.HeartRateBpmInFiveSeconds, 20_000),
        Channel.Speed => new JumpLimits(8, 500, 2000, double.PositiveInfinity, 5000),
        Channel.Distance => new JumpLimits(45, 1000, 10_000, double.PositiveInfinity, 5000),
        Channel.Altitude => new JumpLimits(30, 1000, 10_000, double.PositiveInfinity, 5000),
        _ => null,
    };
}
