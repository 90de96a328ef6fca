namespace LoadWatch.Service.Health;

/// <summary>Notices that the wall clock was set, by a clock that nobody sets.</summary>
public sealed class ClockWatch(TimeProvider clock)
{
    private static readonly TimeSpan Tolerance = TimeSpan.FromMinutes(5);

    private DateTimeOffset wall = clock.GetUtcNow();
    private long steady = clock.GetTimestamp();

    /// <summary>By how much the wall clock was set since the last call, where that is more than five minutes; a machine that slept counts as well.</summary>
    public TimeSpan? Jump()
    {
        var (now, tick) = (clock.GetUtcNow(), clock.GetTimestamp());
        var jump = now - wall - clock.GetElapsedTime(steady, tick);
        (wall, steady) = (now, tick);
        return jump.Duration() > Tolerance ? jump : null;
    }
}
