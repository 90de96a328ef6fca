namespace LoadWatch.Service.Health;

/// <summary>When a loop of the service last got on. For the sweep: a file read, a group settled, days computed, a notice delivered, a sweep ended.</summary>
/// <param name="loop">What the loop is called in the log.</param>
/// <param name="stallAfter">Without a beat for longer than this the loop is stuck.</param>
public class Heartbeat(string loop, TimeProvider clock, TimeSpan stallAfter)
{
    /// <summary>The longest that one step between two beats may take: the child that tries a crashed arrival has the largest limit, about five minutes.</summary>
    public static readonly TimeSpan LongestStep = TimeSpan.FromMinutes(10);

    private long last = clock.GetTimestamp();

    public string Loop => loop;

    public TimeSpan StallAfter => stallAfter;

    public bool IsRecent => Since <= stallAfter;

    /// <summary>Time since the last beat, by a clock that nobody sets.</summary>
    public TimeSpan Since => clock.GetElapsedTime(Volatile.Read(ref last));

    public void Beat() => Volatile.Write(ref last, clock.GetTimestamp());
}

/// <summary>Of the sweeps.</summary>
public sealed class SweepHeartbeat(TimeProvider clock, TimeSpan scanEvery) : Heartbeat("sweep", clock, scanEvery + LongestStep);

/// <summary>Of the timer that writes the status.</summary>
public sealed class StatusHeartbeat(TimeProvider clock) : Heartbeat("status", clock, TimeSpan.FromMinutes(5));

/// <summary>Of the loop that listens to the inboxes and keeps the scan going.</summary>
public sealed class WatchHeartbeat(TimeProvider clock) : Heartbeat("watch", clock, TimeSpan.FromMinutes(5));
