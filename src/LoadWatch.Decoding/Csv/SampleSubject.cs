using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>The rows of one person or device.</summary>
/// <param name="name">As the file writes it; null where it tells none apart.</param>
/// <param name="cell">The bytes that named it first.</param>
internal sealed class SampleSubject(string? name, byte[] cell)
{
    private readonly EndedSessions ended = new();
    private (long First, long Last)? leftOut;

    public string? Name => name;

    public ReadOnlySpan<byte> Cell => cell;

    /// <summary>Who came after it when it was last followed by another.</summary>
    public SampleSubject? Next { get; set; }

    public ClockTrack Clock { get; } = new();

    /// <summary>The rows that are not handed on yet.</summary>
    public SampleColumns Samples { get; private set; } = new();

    /// <summary>Whether its rows may be of several sessions.</summary>
    public bool HasGap { get; private set; }

    /// <summary>Its last row, counted among those of all people.</summary>
    public long LastRow { get; private set; }

    /// <summary>How often another person had come until its last row.</summary>
    public long LastChange { get; private set; }

    /// <summary>Of its last row, milliseconds since 1970.</summary>
    public long LastTime { get; private set; }

    /// <summary>Whether a time is of a session that was handed on.</summary>
    public bool IsGone(long time) => ended.Hold(time);

    /// <summary>Whether a time lies far from all rows held.</summary>
    public bool IsBeyond(long time) => time - Samples.Latest > SessionGaps.LongestMilliseconds || Samples.Earliest - time > SessionGaps.LongestMilliseconds;

    /// <param name="row">Counted among the rows of all people.</param>
    /// <param name="change">How often another person has come until it.</param>
    /// <returns>False for a row of a session that is left out.</returns>
    public bool Add(long time, ReadOnlySpan<double> readings, long row, long change)
    {
        var step = time - LastTime;
        HasGap |= Samples.Count > 0 && step is < 0 or > SessionGaps.LongestMilliseconds;
        (LastRow, LastChange, LastTime) = (row, change, time);
        if (IsLeftOut(time))
        {
            return false;
        }

        Samples.Add(time, readings);
        return true;
    }

    /// <summary>All rows held, as one series or as one for each session.</summary>
    /// <param name="most">Of more sessions no more than one beyond it are told apart; null: all rows are one.</param>
    public IReadOnlyList<SampleSeries> End(int? most)
    {
        var series = Take(times => most is { } number ? SessionGaps.Sessions(times, Math.Max(1, number)) : null);
        series.ToList().ForEach(ended.Add);
        return series;
    }

    /// <summary>All sessions but that of the last row, which is held on.</summary>
    /// <inheritdoc cref="End"/>
    public IReadOnlyList<SampleSeries> EndAllButLast(int most)
    {
        var open = 0;
        var series = Take(times =>
        {
            var sessions = SessionGaps.Sessions(times, Math.Max(1, most));
            open = sessions?.ToList().FindIndex(session => session[^1] == times.Length - 1) ?? 0;
            return sessions;
        });
        Samples = SampleColumns.Of(series[open]);
        var others = series.Where((_, at) => at != open).ToList();
        others.ForEach(ended.Add);
        return others;
    }

    /// <summary>Drops what is held, and what follows until a long gap.</summary>
    public void LeaveOut()
    {
        if (leftOut is { } before)
        {
            ended.Add(before.First, before.Last);
        }

        leftOut = (Samples.Earliest!.Value, Samples.Latest!.Value);
        (Samples, HasGap) = (new SampleColumns(), false);
    }

    private bool IsLeftOut(long time)
    {
        if (leftOut is not { } gone || time < gone.First - SessionGaps.LongestMilliseconds || time > gone.Last + SessionGaps.LongestMilliseconds)
        {
            return false;
        }

        leftOut = (Math.Min(gone.First, time), Math.Max(gone.Last, time));
        return true;
    }

    private IReadOnlyList<SampleSeries> Take(Func<long[], IReadOnlyList<int[]>?> sessionsOf)
    {
        var taken = Samples;
        (Samples, HasGap) = (new SampleColumns(), false);
        return taken.ToSeries(sessionsOf);
    }
}
