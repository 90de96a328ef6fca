namespace LoadWatch.Decoding.Fit;

/// <summary>Pairs the timer's stops and starts.</summary>
internal sealed class TimerPauses
{
    private const int Timer = 0;
    private const int Started = 0;
    private long? stopped;

    /// <summary>Pauses in file order, times as in the file.</summary>
    public PooledList<(long Start, long End)> Closed { get; } = new();

    /// <summary>When the timer stopped and was not started again, or null.</summary>
    public long? Open => stopped;

    public void Read(in FitMessage message, long? time)
    {
        if (message.Int(FitFields.Event.Kind) != Timer || time is not { } at)
            return;

        var type = message.Int(FitFields.Event.Type);
        if (type is 1 or 4 or 8 or 9)
            stopped ??= at;
        else if (type == Started)
            Close(at);
    }

    private void Close(long at)
    {
        if (stopped is { } since && since < at)
            Closed.Add((since, at));

        stopped = null;
    }
}
