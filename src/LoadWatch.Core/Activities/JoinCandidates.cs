using NodaTime;

namespace LoadWatch.Activities;

/// <summary>
/// Which recordings of its date a stated session may belong to. All must fit by sport (<see cref="SportMatch"/>). With a start: those that run at that
/// time, begin within half an hour of it (a choice) or before its stated minutes are over, those within half an hour first. Else with a number: the recording of that number, by start, among those of the
/// best fit; where there are not so many, among all that fit; then among all of the date. Else: those of the best fit that its table does not tell of yet.
/// </summary>
internal static class JoinCandidates
{
    private static readonly Duration Slack = Duration.FromMinutes(30);

    /// <summary>None, the one, or several among which nothing decides.</summary>
    /// <param name="recorded">Of the date, by start.</param>
    public static List<SessionParts> Of(StatedSession stated, List<SessionParts> recorded)
    {
        var fitting = recorded.FindAll(one => Fit(stated, one) != SportFit.None);
        return (stated.Start, stated.Order) switch
        {
            ({ } start, _) => AtTime(stated, start, recorded, fitting),
            (null, { } order) => ByNumber(stated, order, recorded, fitting),
            _ => Best(stated, fitting.FindAll(one => !one.IsToldBy(stated.Layout))),
        };
    }

    private static List<SessionParts> AtTime(StatedSession stated, LocalTime start, List<SessionParts> recorded, List<SessionParts> fitting)
    {
        var running = fitting.FindAll(one => RunsAt(one.Recording!, start) || BeganWithin(one.Recording!, start, stated.Minutes));
        var beginning = running.FindAll(one => BeginsAt(one.Recording!, start));
        var near = Best(stated, beginning.Count > 0 ? beginning : running);
        return near.Count > 1 && stated.Order is { } order && ByNumber(stated, order, recorded, near) is [var numbered] ? [numbered] : near;
    }

    private static List<SessionParts> ByNumber(StatedSession stated, int order, List<SessionParts> recorded, List<SessionParts> fitting)
    {
        List<SessionParts>[] circles = [Best(stated, fitting), fitting, recorded];
        var found = circles
            .Where(circle => order >= 1 && order <= circle.Count)
            .Select(circle => circle[order - 1])
            .FirstOrDefault(one => fitting.Contains(one) && !one.IsToldBy(stated.Layout));
        return found is null ? [] : [found];
    }

    private static List<SessionParts> Best(StatedSession stated, List<SessionParts> fitting)
    {
        var best = fitting.Select(one => Fit(stated, one)).DefaultIfEmpty().Max();
        return fitting.FindAll(one => Fit(stated, one) == best);
    }

    private static SportFit Fit(StatedSession stated, SessionParts one)
    {
        var recording = one.Recording!.Winner;
        return stated.Sets is null ? SportMatch.Of(stated.Sport, recording.Sport) : SportMatch.OfSets(recording.Sport, recording.Sets);
    }

    private static bool BeginsAt(RecordedActivity recording, LocalTime start) =>
        Since(recording, start) >= -Slack && Since(recording, start) <= Slack;

    private static bool RunsAt(RecordedActivity recording, LocalTime start) =>
        BeginsAt(recording, start) || (Since(recording, start) > Slack && Since(recording, start).TotalSeconds <= Seconds(recording));

    /// <summary>A watch switched on late: the recording began while the stated session went on.</summary>
    private static bool BeganWithin(RecordedActivity recording, LocalTime start, double? minutes) =>
        Since(recording, start) <= Duration.Zero && -Since(recording, start).TotalMinutes <= (minutes ?? 0);

    private static Duration Since(RecordedActivity recording, LocalTime start) =>
        Duration.FromNanoseconds(start.NanosecondOfDay - recording.LocalStart.TimeOfDay.NanosecondOfDay);

    private static double Seconds(RecordedActivity recording) => recording.Winner.ElapsedSeconds ?? recording.Winner.TimerSeconds ?? 0;
}
