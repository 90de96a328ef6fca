using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Fit;

/// <summary>Shares what a part holds among its sessions; each item belongs to exactly one.</summary>
internal sealed class PartRecordings
{
    private readonly PartContent content;
    private readonly List<SessionFacts> sessions;
    private readonly SessionOwners owners;

    private PartRecordings(PartContent content)
    {
        this.content = content;
        sessions = content.Sessions.Count > 0
            ? content.Sessions
            : [new SessionFacts(null, content.StatedSport ?? Sport.Generic, null, null, null)];
        owners = new SessionOwners(sessions);
    }

    /// <summary>The recordings of a part, numbered from <paramref name="firstPart"/>; none where it holds no training.</summary>
    public static IReadOnlyList<Recording> Of(PartContent content, int firstPart) =>
        content.HasTraining ? new PartRecordings(content).Build(firstPart) : [];

    private List<Recording> Build(int firstPart)
    {
        var split = new SampleSplit(content.Samples, owners);
        var shadowed = split.Shadowed();
        var samples = split.HandOver(content.Clock);
        var sets = Shared(content.Sets, set => set.Start, Dated);
        var (laps, lengths) = (Counts(content.Laps, lap => lap), Counts(content.Lengths, length => length));
        var pauses = Shared(content.Pauses.Closed, pause => pause.Start, Dated);
        var intervals = Shared(content.Intervals, interval => interval.Time, interval => interval.Milliseconds);
        var beats = Shared(content.Late.Beats, beat => beat.Time, Dated);
        return [.. sessions.Select((session, i) => Basics(session, samples[i]) with
        {
            Part = firstPart + i,
            Sets = sets[i],
            Laps = laps[i],
            Lengths = lengths[i],
            Pauses = Pauses(pauses[i], i, samples[i]),
            LateHeartRates = InTimeOrder(beats[i]),
            BeatIntervals = intervals[i],
            Shadowed = shadowed is null ? session.Shadowed : session.Shadowed with { Channels = shadowed[i] },
        })];
    }

    private Recording Basics(SessionFacts session, SampleSeries samples) => new()
    {
        Part = 0,
        Sport = session.Sport,
        Start = content.Clock.Instant(session.Start) ?? samples.First,
        LocalOffset = content.LocalOffsetSeconds is { } seconds ? Offset.FromSeconds(seconds) : null,
        ElapsedSeconds = session.ElapsedSeconds ?? (samples.Last - samples.First)?.TotalSeconds,
        TimerSeconds = session.TimerSeconds,
        DistanceMetres = session.DistanceMetres,
        Samples = samples,
        Device = content.Device,
        CutOff = content.CutOff,
    };

    /// <summary>The stop that ends a recording is no pause: an open one counts only if samples follow it. What cannot be dated is left out.</summary>
    private Pause[] Pauses(Pause?[] closed, int session, SampleSeries samples)
    {
        var open = content.Pauses.Open is { } stop && owners.Of(stop) == session && content.Clock.Instant(stop) is { } start && samples.Last > start
            ? new Pause(start, null)
            : (Pause?)null;
        var pauses = new Pause[closed.Count(pause => pause is not null) + (open is null ? 0 : 1)];
        var count = 0;
        foreach (var pause in closed.Append(open))
        {
            if (pause is { } dated)
                pauses[count++] = dated;
        }

        return InOrder(pauses, pause => pause.Start);
    }

    /// <summary>How many of the items belong to each session.</summary>
    private int[] Counts<T>(PooledList<T> items, Func<T, long?> time)
    {
        var counts = new int[sessions.Count];
        for (var i = 0; i < items.Count; i++)
            counts[owners.Of(time(items[i]))]++;

        return counts;
    }

    /// <summary>The items of each session, each made into what is handed out.</summary>
    private TShared[][] Shared<T, TShared>(PooledList<T> items, Func<T, long?> time, Func<T, TShared> made)
    {
        var left = Counts(items, time);
        var shared = Array.ConvertAll(left, count => count == 0 ? [] : new TShared[count]);
        for (var i = 0; i < items.Count; i++)
        {
            var owner = owners.Of(time(items[i]));
            shared[owner][^left[owner]--] = made(items[i]);
        }

        return shared;
    }

    private Pause? Dated((long Start, long End) pause) =>
        content.Clock.Instant(pause.Start) is { } start ? new Pause(start, content.Clock.Instant(pause.End)) : null;

    private StrengthSet Dated(SetFacts set) =>
        new(content.Clock.Instant(set.Start), set.DurationSeconds, set.Active, set.Exercise, set.Repetitions, set.Kilograms);

    private TimedHeartRate Dated((long Time, int BeatsPerMinute) beat) => new(content.Clock.UnixMilliseconds(beat.Time), beat.BeatsPerMinute);

    /// <summary>Beats that cannot be dated are left out.</summary>
    private static TimedHeartRate[] InTimeOrder(TimedHeartRate[] beats)
    {
        var ordered = InOrder(beats, beat => beat.UnixMilliseconds);
        return ordered is [{ UnixMilliseconds: SampleSeries.Undated }, ..] ? Array.FindAll(ordered, beat => beat.UnixMilliseconds != SampleSeries.Undated) : ordered;
    }

    /// <summary>As they are where they are in order, which is usual.</summary>
    private static T[] InOrder<T, TKey>(T[] items, Func<T, TKey> key)
        where TKey : IComparable<TKey>
    {
        for (var i = 1; i < items.Length; i++)
        {
            if (key(items[i]).CompareTo(key(items[i - 1])) < 0)
                return [.. items.OrderBy(key)];
        }

        return items;
    }
}
