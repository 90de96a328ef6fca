using LoadWatch.Quality;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>A recording without what lies outside a window.</summary>
/// <param name="LeftOut">What was left out, one phrase each: <c>38 min after the planned session left out</c>; empty where nothing was.</param>
/// <param name="Cuts">The same as cuts: <see cref="CutReason.OutsidePlan"/>, shares of the time from the first moment to the last.</param>
public sealed record CutRecording(Recording Recording, IReadOnlyList<string> LeftOut, IReadOnlyList<Cut> Cuts)
{
    /// <summary>A recording of which nothing was left out.</summary>
    public static CutRecording Nothing(Recording recording) => new(recording, [], []);
}

/// <summary>Cuts a recording to the time of a planned session.</summary>
public static class RecordingCut
{
    /// <summary>
    /// Keeps samples, beats of their own and sets from <paramref name="from"/> to <paramref name="to"/>, both included, and the pauses that
    /// reach into it; undated samples go, sets without a time stay. Totals of the whole session are no longer right: elapsed time is
    /// counted again, distance is that between the readings, timer time is null; laps and lengths stay as recorded. The recording as it
    /// is where nothing lies outside, or nothing usable inside.
    /// </summary>
    public static CutRecording To(Recording recording, Instant from, Instant to)
    {
        ArgumentNullException.ThrowIfNull(recording);
        var moments = Moments(recording).ToList();
        var (early, late) = (moments.FindAll(time => time < from), moments.FindAll(time => time > to));
        if (early.Count + late.Count == 0)
        {
            return CutRecording.Nothing(recording);
        }

        var rest = Within(recording, from, to);
        return HoldsUsable(rest)
            ? new CutRecording(rest, [.. Phrase(early, from, "before"), .. Phrase(late, to, "after")], [.. OutsideCuts(recording, moments, from, to)])
            : CutRecording.Nothing(recording);
    }

    private static IEnumerable<Cut> OutsideCuts(Recording recording, List<Instant> moments, Instant from, Instant to)
    {
        var (first, last) = (moments.Min(), moments.Max());
        // A moment on an edge belongs to the session.
        var millisecond = Duration.FromMilliseconds(1);
        Stretch[] outside = [Outside(first, Instant.Min(from, last)), Outside(Instant.Max(to + millisecond, first), last + millisecond)];
        var whole = (last - first).TotalMilliseconds;
        return outside
            .Where(stretch => stretch.From < stretch.To)
            .Select(stretch => new Cut(
                null, CutReason.OutsidePlan, stretch, Rows(recording, stretch), stretch.To!.Value - stretch.From!.Value, Significant.Round((stretch.To.Value - stretch.From.Value) / whole)));
    }

    private static Stretch Outside(Instant start, Instant end) => new(start.ToUnixTimeMilliseconds(), end.ToUnixTimeMilliseconds());

    private static int Rows(Recording recording, Stretch stretch) =>
        recording.Gathered.Values.Append(recording.Samples).Max(series => series.Times.Count(time => time != SampleSeries.Undated && stretch.Holds(time)));

    private static IEnumerable<Instant> Moments(Recording recording) =>
    [
        .. new[] { recording.First, recording.Last }.OfType<Instant>(),
        .. recording.LateHeartRates.Select(beat => Instant.FromUnixTimeMilliseconds(beat.UnixMilliseconds)),
        .. recording.Sets.Select(set => set.Start).OfType<Instant>(),
    ];

    private static Recording Within(Recording recording, Instant from, Instant to)
    {
        var kept = recording with
        {
            Samples = Rows(recording.Samples, from.ToUnixTimeMilliseconds(), to.ToUnixTimeMilliseconds()),
            Gathered = recording.Gathered.ToDictionary(one => one.Key, one => Rows(one.Value, from.ToUnixTimeMilliseconds(), to.ToUnixTimeMilliseconds())),
            LateHeartRates = [.. recording.LateHeartRates.Where(beat => IsIn(Instant.FromUnixTimeMilliseconds(beat.UnixMilliseconds)))],
            Sets = [.. recording.Sets.Where(set => set.Start is not { } start || IsIn(start))],
            Pauses = [.. recording.Pauses.Where(pause => pause.Start <= to && !(pause.End < from)).Select(pause => Clipped(pause, from, to))],
            TimerSeconds = null,
        };
        var moments = Moments(kept).ToList();
        return moments.Count == 0 ? kept : kept with
        {
            Start = moments.Min(),
            ElapsedSeconds = (moments.Max() - moments.Min()).TotalSeconds,
            DistanceMetres = DistanceMetres(kept),
        };

        bool IsIn(Instant time) => time >= from && time <= to;
    }

    private static SampleSeries Rows(SampleSeries samples, long from, long to)
    {
        List<int> rows = [];
        for (var row = 0; row < samples.Count; row++)
        {
            if (samples.UnixMilliseconds[row] is var time and not SampleSeries.Undated && time >= from && time <= to)
            {
                rows.Add(row);
            }
        }

        return samples.Take(rows);
    }

    private static Pause Clipped(Pause pause, Instant from, Instant to) =>
        new(Instant.Max(pause.Start, from), pause.End is { } end ? Instant.Min(end, to) : null);

    /// <summary>The largest usable reading less the smallest: a running total may have begun before the window.</summary>
    private static double? DistanceMetres(Recording kept)
    {
        var readings = UsableSamples.Of(kept, Channel.Distance);
        return readings.Count > 0 && readings.Extremes() is var (smallest, largest) ? largest - smallest : null;
    }

    private static bool HoldsUsable(Recording rest) =>
        rest.Sets.Any(set => set.Active)
        || UsableSamples.ChannelsOf(rest).Any(channel => UsableSamples.Of(rest, channel).Count > 0);

    /// <summary>From the edge of the window to the furthest moment left out, minutes rounded up.</summary>
    private static IEnumerable<string> Phrase(List<Instant> leftOut, Instant edge, string side) => leftOut.Count == 0
        ? []
        : [$"{Minutes(side == "before" ? edge - leftOut.Min() : leftOut.Max() - edge)} min {side} the planned session left out"];

    private static long Minutes(Duration outside) => (long)Math.Ceiling(outside.TotalMinutes);
}
