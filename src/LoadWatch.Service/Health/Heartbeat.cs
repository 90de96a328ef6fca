namespace LoadWatch.Service.Health;

/// <summary>When the service last got on with its work: a file read, a group settled, days computed, a notice delivered, a sweep ended.</summary>
/// <param name="stallAfter">Without a beat for longer than this the work is stuck.</param>
public sealed class Heartbeat(TimeProvider clock, TimeSpan stallAfter)
{
    /// <summary>The longest that one step between two beats may take: the child that tries a crashed arrival has the largest limit, about five minutes.</summary>
    public static readonly TimeSpan LongestStep = TimeSpan.FromMinutes(10);

    private long last = clock.GetTimestamp();

    public TimeSpan StallAfter => stallAfter;

    public bool IsRecent => clock.GetElapsedTime(Volatile.Read(ref last)) <= stallAfter;

    public void Beat() => Volatile.Write(ref last, clock.GetTimestamp());
}
