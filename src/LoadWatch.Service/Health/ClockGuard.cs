using LoadWatch.Service.Export;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Health;

/// <summary>
/// Holds the clock against the last sweep's: after a dead battery it says 1970, then every recording would seem to come from the future, and every alert
/// would return. Nothing is done until it is right.
/// </summary>
public sealed class ClockGuard(Store store)
{
    private const string Moment = "sweep";

    /// <summary>Clocks of one machine may differ so much between two starts.</summary>
    private static readonly Duration Tolerance = Duration.FromMinutes(5);

    /// <summary>Kept so exactly only, since every keeping is a commit.</summary>
    private static readonly Duration Precision = Duration.FromHours(1);

    private Instant? last = store.Read(session => session.Moments.Of(Moment));

    /// <summary>Why nothing may be done now, or null.</summary>
    public string? FaultAt(Instant now) => last is { } known && now < known - Tolerance
        ? $"The clock of this machine says {Words.Utc(now)}, but the last sweep was at {Words.Utc(known)}: nothing is done until the clock is right. "
            + "Where the earlier clock was the wrong one, stop the service and run loadwatch sweep once."
        : null;

    /// <summary>After a sweep.</summary>
    public void Note(Instant now)
    {
        if (last is not { } known || (now - known).TotalSeconds is var seconds && Math.Abs(seconds) >= Precision.TotalSeconds)
        {
            store.Write(session => session.Moments.Put(Moment, now));
            last = now;
        }
    }
}
