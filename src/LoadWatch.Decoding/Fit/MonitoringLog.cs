namespace LoadWatch.Decoding.Fit;

/// <summary>
/// What a watch writes of the whole day, minute by minute: heart rate, and steps from counters that run up through the day, one for each kind of movement. Times
/// are full, or the low 16 bits of one that follows the last full time.
/// </summary>
internal sealed class MonitoringLog(MemoryBudget budget)
{
    private const int MinuteCost = 160;
    private const int WalkedMinuteCost = 500;
    private const int LongestSpread = 15;
    private const int Running = 1;
    private const int Walking = 6;
    private const int MinuteMilliseconds = 60_000;
    private readonly Dictionary<int, (long Time, double Count)> counters = [];
    private readonly SortedDictionary<long, MonitoredMinute> minutes = [];
    private long? full;

    public bool IsEmpty => minutes.Count == 0;

    /// <summary>By the number of the minute since the FIT epoch.</summary>
    public IReadOnlyDictionary<long, MonitoredMinute> Minutes => minutes;

    /// <summary>A message that only brings a full time.</summary>
    public void Note(long? time) => full = time ?? full;

    public void Read(in FitMessage message, long? time)
    {
        Note(time);
        if ((time ?? Short(message.UInt(FitFields.Monitoring.ShortTimestamp))) is not { } at || !FitClock.IsDate(at - ((LongestSpread + 1) * MinuteMilliseconds)))
            return;

        if (message.Int(FitFields.Monitoring.HeartRate) is { } rate and > 0)
            Keep(Before(at), Known(Before(at)) with { HeartRate = rate });

        if (Kind(message) is { } kind and (Running or Walking) && (message.Number(FitFields.Monitoring.Steps) ?? message.Number(FitFields.Monitoring.Steps16)) is { } count)
            Count(kind, at, count);
    }

    private static int? Kind(in FitMessage message) =>
        message.Int(FitFields.Monitoring.Kind) ?? (message.Int(FitFields.Monitoring.KindAndIntensity) & 0x1F);

    private long? Short(uint? low) =>
        full is { } time && low is { } bits ? ((time / 1000) + ((bits - (time / 1000)) & 0xFFFF)) * 1000 : null;

    /// <summary>A value is written when its minute is over.</summary>
    private static long Before(long time) => (time - 1) / MinuteMilliseconds;

    /// <summary>
    /// Steps since the counter was last written belong to the minutes since then; after a longer silence nobody knows to which, and none gets them. A counter that
    /// fell began anew.
    /// </summary>
    private void Count(int kind, long at, double count)
    {
        var isKnown = counters.TryGetValue(kind, out var before) && before.Time < at;
        counters[kind] = (at, count);
        if (!isKnown || (count >= before.Count ? count - before.Count : count) is not (> 0 and var steps))
            return;

        var spread = Math.Max(1, Before(at) - Before(before.Time));
        if (spread > LongestSpread)
            return;

        for (var minute = Before(at); minute > Before(at) - spread; minute--)
        {
            var known = Known(minute);
            Keep(minute, known with
            {
                Steps = known.Steps + (steps / spread),
                RunningSteps = known.RunningSteps + (kind == Running ? steps / spread : 0),
            });
        }
    }

    private MonitoredMinute Known(long minute) => minutes.GetValueOrDefault(minute);

    private void Keep(long minute, MonitoredMinute said)
    {
        var isKnown = minutes.TryGetValue(minute, out var before);
        minutes[minute] = said;
        budget.Spend((isKnown ? 0 : MinuteCost) + (before.Steps > 0 || said.Steps == 0 ? 0 : WalkedMinuteCost));
    }
}

/// <param name="HeartRate">Beats per minute, or null.</param>
/// <param name="Steps">Of both feet.</param>
/// <param name="RunningSteps">How many of them were running.</param>
internal readonly record struct MonitoredMinute(int? HeartRate, double Steps, double RunningSteps);
