using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Walks and runs in the log of a day, so that a person who only walks has a record. A bout lasts ten minutes or longer: shorter ones counted for little in
/// the recommendations that asked for a length (Garber et al. 2011, Quantity and quality of exercise, Med Sci Sports Exerc 43:1334-1359). Sixty steps a minute
/// as the least, and two minutes as the longest halt at a crossing, are choices.
/// </summary>
internal static class MonitoredBouts
{
    private const int LeastMinutes = 10;
    private const int LeastSteps = 60;
    private const int LongestHalt = 2;

    /// <summary>A reading stands for 10 s at most, so a minute's values are given that often.</summary>
    private const int RowsPerMinute = 6;
    private const int RowMilliseconds = 10_000;

    /// <summary>One recording a bout, numbered from <paramref name="firstPart"/>.</summary>
    public static IEnumerable<Recording> Of(PartContent content, int firstPart)
    {
        var part = firstPart;
        foreach (var bout in Bouts([.. content.Monitoring.Minutes]))
            yield return Recorded(content, bout, part++);
    }

    /// <summary>The minutes of each bout that something was written in, in time order.</summary>
    private static IEnumerable<ArraySegment<KeyValuePair<long, MonitoredMinute>>> Bouts(KeyValuePair<long, MonitoredMinute>[] minutes)
    {
        var (first, last) = (-1, -1);
        for (var i = 0; i <= minutes.Length; i++)
        {
            if (i < minutes.Length && minutes[i].Value.Steps < LeastSteps)
                continue;

            if (first >= 0 && i < minutes.Length && minutes[i].Key - minutes[last].Key <= LongestHalt + 1)
            {
                last = i;
                continue;
            }

            if (first >= 0 && minutes[last].Key - minutes[first].Key + 1 >= LeastMinutes)
                yield return new(minutes, first, last - first + 1);

            (first, last) = (i, i);
        }
    }

    private static Recording Recorded(PartContent content, ArraySegment<KeyValuePair<long, MonitoredMinute>> bout, int part)
    {
        var seconds = (bout[^1].Key - bout[0].Key + 1) * 60;
        var samples = Samples(content, bout);
        return new Recording
        {
            Part = part,
            Sport = new Sport(IsRun(bout) ? "running" : "walking"),
            Start = samples.First,
            LocalOffset = content.LocalOffsetSeconds is { } offset ? Offset.FromSeconds(offset) : null,
            ElapsedSeconds = seconds,
            TimerSeconds = seconds,
            Samples = samples,
            Device = content.Device,
        };
    }

    private static bool IsRun(ArraySegment<KeyValuePair<long, MonitoredMinute>> bout) =>
        bout.Sum(minute => minute.Value.RunningSteps) * 2 > bout.Sum(minute => minute.Value.Steps);

    /// <summary>Cadence is that of one foot, as in every recording.</summary>
    private static SampleSeries Samples(PartContent content, ArraySegment<KeyValuePair<long, MonitoredMinute>> bout)
    {
        var first = bout[0].Key;
        var rows = (int)((bout[^1].Key - first + 1) * RowsPerMinute) + 1;
        var (times, rates, cadences) = (new long[rows], new double[rows], new double[rows]);
        Array.Fill(rates, double.NaN);
        for (var row = 0; row < rows; row++)
            times[row] = content.Clock.UnixMilliseconds((first * RowsPerMinute * RowMilliseconds) + ((long)row * RowMilliseconds));

        foreach (var (minute, values) in bout)
        {
            var from = (int)(minute - first) * RowsPerMinute;
            var count = minute == bout[^1].Key ? RowsPerMinute + 1 : RowsPerMinute;
            rates.AsSpan(from, count).Fill(values.HeartRate ?? double.NaN);
            cadences.AsSpan(from, count).Fill(values.Steps / 2);
        }

        return new SampleSeries(
            times,
            Array.Exists(rates, double.IsFinite)
                ? new Dictionary<Channel, double[]> { [Channel.HeartRate] = rates, [Channel.Cadence] = cadences }
                : new Dictionary<Channel, double[]> { [Channel.Cadence] = cadences });
    }
}
