using NodaTime;

namespace LoadWatch.Recordings;

/// <summary>One session as its file tells it: raw, nothing cut, nothing merged.</summary>
public sealed record Recording
{
    /// <summary>Counts the recordings of one file from 1, in file order.</summary>
    public required int Part { get; init; }

    /// <summary>The person or device as the file writes it, where it holds several people; null: the owner of the file.</summary>
    public string? Subject { get; init; }

    public required Sport Sport { get; init; }

    /// <summary>Start of the session; null where the file carries no date (device uptime, no clock).</summary>
    public required Instant? Start { get; init; }

    /// <summary>Local time minus UTC as the device stated it, or null.</summary>
    public Offset? LocalOffset { get; init; }

    /// <summary>Total elapsed time in seconds, pauses included: the session's own total, else last sample minus first; null without either.</summary>
    public double? ElapsedSeconds { get; init; }

    /// <summary>Time in seconds during which the timer ran, as the session states it, or null.</summary>
    public double? TimerSeconds { get; init; }

    /// <summary>Distance of the session in metres as the session states it, or null.</summary>
    public double? DistanceMetres { get; init; }

    public SampleSeries Samples { get; init; } = SampleSeries.Empty;

    /// <summary>
    /// Channels whose readings several recordings of the session gave, each as a series of that channel alone; they count instead of those of
    /// <see cref="Samples"/>. Empty in what a file tells.
    /// </summary>
    public IReadOnlyDictionary<Channel, SampleSeries> Gathered { get; init; } = new Dictionary<Channel, SampleSeries>();

    /// <summary>When the timer stood while the readings of <see cref="Gathered"/> were taken, by channel.</summary>
    public IReadOnlyDictionary<Channel, IReadOnlyList<Pause>> GatheredPauses { get; init; } = new Dictionary<Channel, IReadOnlyList<Pause>>();

    /// <summary>Beats delivered in messages of their own (chest straps under water), in time order; not merged into the samples.</summary>
    public IReadOnlyList<TimedHeartRate> LateHeartRates { get; init; } = [];

    /// <summary>Milliseconds from beat to beat in the order of the file, 1 to 65534; empty where the device kept none.</summary>
    public IReadOnlyList<int> BeatIntervals { get; init; } = [];

    public IReadOnlyList<StrengthSet> Sets { get; init; } = [];

    /// <summary>Stretches during which the timer stood, in time order.</summary>
    public IReadOnlyList<Pause> Pauses { get; init; } = [];

    public int Laps { get; init; }

    /// <summary>Pool lengths as the device wrote them; some write an idle one for each rest at the wall, which counts here too.</summary>
    public int Lengths { get; init; }

    /// <summary>What is stated a second time by another app and does not count.</summary>
    public Shadowed Shadowed { get; init; } = Shadowed.None;

    public Device Device { get; init; } = Device.Unknown;

    /// <summary>What its file lacks behind it, in plain words: it was cut off there, and what lies before was used. Null where the file is whole.</summary>
    public string? CutOff { get; init; }

    /// <summary>Earliest dated row of any series, or null.</summary>
    public Instant? First => Gathered.Values.Append(Samples).Min(series => series.First);

    /// <summary>Latest dated row of any series, or null.</summary>
    public Instant? Last => Gathered.Values.Append(Samples).Max(series => series.Last);

    /// <summary>The series that holds the readings of a channel.</summary>
    public SampleSeries SeriesOf(Channel channel) => Gathered.GetValueOrDefault(channel, Samples);
}

/// <summary>A heart-rate reading with its own time.</summary>
/// <param name="UnixMilliseconds">Milliseconds since 1970-01-01T00:00:00Z.</param>
/// <param name="BeatsPerMinute">1 to 254.</param>
public readonly record struct TimedHeartRate(long UnixMilliseconds, int BeatsPerMinute);

/// <summary>A stretch during which the timer stood. <paramref name="End"/> is null when it was never started again.</summary>
public readonly record struct Pause(Instant Start, Instant? End);

/// <summary>The recording device by its numbers as recorded; each null where not stated.</summary>
public sealed record Device(int? Manufacturer, int? Product, long? Serial)
{
    public static Device Unknown { get; } = new(null, null, null);
}
