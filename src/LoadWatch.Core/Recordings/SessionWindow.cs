using NodaTime;

namespace LoadWatch.Recordings;

/// <summary>
/// Which stretch of a recording the plan speaks of. A device that was switched on at the gate and off at home holds the bus ride too.
/// </summary>
public static class SessionWindow
{
    /// <summary>How much before and after a planned session still belongs to it. A choice: getting ready, extra time, a late end.</summary>
    public static Duration Tolerance { get; } = Duration.FromMinutes(15);

    /// <summary>
    /// From the start of the first planned session that the recording holds to the end of the last, each with the tolerance. It holds one
    /// when they overlap by half of the shorter of the two, as in I-9: so a session that was moved by an hour is not taken for the rest
    /// of another. Null where it holds none, or has no time.
    /// </summary>
    /// <param name="planned">Start and end of the sessions planned for the person; in any order.</param>
    /// <param name="tolerance">Null for <see cref="Tolerance"/>.</param>
    public static Interval? Of(Recording recording, IEnumerable<Interval> planned, Duration? tolerance = null)
    {
        if (Extent(recording) is not { } extent)
        {
            return null;
        }

        var held = planned.Where(session => session.HasStart && session.HasEnd && Holds(extent, session)).ToList();
        var around = tolerance ?? Tolerance;
        return held.Count == 0
            ? null
            : new Interval(held.Min(session => session.Start) - around, held.Max(session => session.End) + around);
    }

    private static Interval? Extent(Recording recording) => recording switch
    {
        { First: { } first, Last: { } last } => new Interval(first, last),
        { Start: { } start, ElapsedSeconds: { } seconds } when double.IsFinite(seconds) && seconds >= 0 =>
            new Interval(start, start + Duration.FromSeconds(seconds)),
        _ => null,
    };

    private static bool Holds(Interval recording, Interval session)
    {
        var common = Instant.Min(recording.End, session.End) - Instant.Max(recording.Start, session.Start);
        return common > Duration.Zero && common * 2 >= Duration.Min(recording.Duration, session.Duration);
    }
}
