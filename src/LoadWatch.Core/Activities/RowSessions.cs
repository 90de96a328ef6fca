using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>
/// Whether two tables tell of the same session that nobody recorded: a rating and a set log of one class are one session. They are, unless sport, number or
/// start (more than half an hour apart, a choice) say otherwise.
/// </summary>
internal static class RowSessions
{
    private static readonly Duration Slack = Duration.FromMinutes(30);

    public static bool MayBeOne(StatedSession stated, SessionParts session) =>
        !session.IsToldBy(stated.Layout) && session.Stated.All(other => FitsBySport(stated, other) && FitsByTime(stated, other));

    private static bool FitsBySport(StatedSession one, StatedSession other) => (one.Sets, other.Sets) switch
    {
        (null, null) => SportMatch.Of(one.Sport, other.Sport ?? Sport.Generic) != SportFit.None,
        (null, _) => SportMatch.OfSets(one.Sport ?? Sport.Generic, ownSets: 0) != SportFit.None,
        (_, null) => SportMatch.OfSets(other.Sport ?? Sport.Generic, ownSets: 0) != SportFit.None,
        _ => true,
    };

    private static bool FitsByTime(StatedSession one, StatedSession other)
    {
        if (one.Start is { } start && other.Start is { } otherStart)
        {
            return Contains(one, start, otherStart) || Contains(other, otherStart, start);
        }

        return one.Order is null || other.Order is null || one.Order == other.Order;
    }

    /// <summary>Whether a time lies within half an hour of the start or in the stated minutes after it.</summary>
    private static bool Contains(StatedSession session, LocalTime start, LocalTime time)
    {
        var since = Duration.FromNanoseconds(time.NanosecondOfDay - start.NanosecondOfDay);
        return since >= Duration.Zero && (since <= Slack || since.TotalMinutes <= session.Minutes);
    }
}
