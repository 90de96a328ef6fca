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
        var samples = SampleSplit.Of(content.Samples, content.Clock, owners);
        var shadowed = SampleSplit.Shadowed(content.Samples, content.Clock, owners);
        var sets = Shared(content.Sets, set => set.Start);
        var laps = Shared(content.Laps, lap => lap);
        var lengths = Shared(content.Lengths, length => length);
        var pauses = Shared(content.Pauses.All, pause => pause.Start);
        var intervals = Shared(content.Intervals.Items, interval => interval.Time, interval => interval.Milliseconds);
        var beats = Shared(content.Late.Beats.Items, beat => beat.Time, Dated);
        return [.. sessions.Select((session, i) => Basics(session, samples[i]) with
        {
            Part = firstPart + i,
            Sets = [.. sets[i].Select(set => set.Set with { Start = content.Clock.Instant(set.Start) })],
            Laps = laps[i].Count,
            Lengths = lengths[i].Count,
            Pauses = Pauses(pauses[i], samples[i]),
            LateHeartRates = InTimeOrder(beats[i]),
            BeatIntervals = intervals[i],
            Shadowed = shadowed is null ? session.Shadowed : session.Shadowed with { Channels = Statistics(shadowed[i]) },
        })];
    }

    private static Dictionary<Channel, ChannelStatistics> Statistics(SampleSeries samples) =>
        samples.Channels.ToDictionary(channel => channel, channel => ChannelStatistics.Of(samples, channel));

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

    private List<T>[] Shared<T>(IEnumerable<T> items, Func<T, long?> time)
    {
        var shared = sessions.ConvertAll(_ => new List<T>()).ToArray();
        foreach (var item in items)
            shared[owners.Of(time(item))].Add(item);

        return shared;
    }

    /// <summary>The stop that ends a recording is no pause: an open one counts only if samples follow it.</summary>
    private List<Pause> Pauses(List<(long Start, long? End)> stops, SampleSeries samples)
    {
        var pauses = new List<Pause>();
        foreach (var (from, to) in stops)
        {
            if (content.Clock.Instant(from) is { } start && (to is not null || samples.Last > start))
                pauses.Add(new Pause(start, content.Clock.Instant(to)));
        }

        return [.. pauses.OrderBy(pause => pause.Start)];
    }

    /// <summary>The same for many items, each made into another, without a list that grows.</summary>
    private TShared[][] Shared<T, TShared>(ReadOnlySpan<T> items, Func<T, long?> time, Func<T, TShared> made)
    {
        var counts = new int[sessions.Count];
        foreach (var item in items)
            counts[owners.Of(time(item))]++;

        var shared = Array.ConvertAll(counts, count => count == 0 ? [] : new TShared[count]);
        foreach (var item in items)
        {
            var owner = owners.Of(time(item));
            shared[owner][^counts[owner]--] = made(item);
        }

        return shared;
    }

    private TimedHeartRate Dated((long Time, int BeatsPerMinute) beat) => new(content.Clock.UnixMilliseconds(beat.Time), beat.BeatsPerMinute);

    /// <summary>Beats that cannot be dated are left out.</summary>
    private static TimedHeartRate[] InTimeOrder(TimedHeartRate[] beats)
    {
        for (var i = 1; i < beats.Length; i++)
        {
            if (beats[i].UnixMilliseconds < beats[i - 1].UnixMilliseconds)
            {
                beats = [.. beats.OrderBy(beat => beat.UnixMilliseconds)];
                break;
            }
        }

        return beats is [{ UnixMilliseconds: SampleSeries.Undated }, ..] ? Array.FindAll(beats, beat => beat.UnixMilliseconds != SampleSeries.Undated) : beats;
    }
}
