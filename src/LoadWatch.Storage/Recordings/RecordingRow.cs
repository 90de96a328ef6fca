using LoadWatch.Activities;
using LoadWatch.Recordings;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Recordings;

/// <summary>A row of <c>recording</c>.</summary>
internal class RecordingRow
{
    public const string Columns =
        "sha, part, person, start, local_offset_seconds, sport, elapsed_seconds, timer_seconds, source, channels, samples, sets, samples_digest, distance_metres, day_begins_seconds";

    public string Sha { get; init; } = "";

    public int Part { get; init; }

    public string Person { get; init; } = "";

    public Instant Start { get; init; }

    public int LocalOffsetSeconds { get; init; }

    public string Sport { get; init; } = "";

    public double? ElapsedSeconds { get; init; }

    public double? TimerSeconds { get; init; }

    public string Source { get; init; } = "";

    public string Channels { get; init; } = "";

    public int Samples { get; init; }

    public int Sets { get; init; }

    public long SamplesDigest { get; init; }

    public double? DistanceMetres { get; init; }

    public long DayBeginsSeconds { get; init; }

    public static RecordingRow From(RecordingSummary recording) => new()
    {
        Sha = recording.Sha,
        Part = recording.Part,
        Person = recording.Person,
        Start = recording.Start,
        LocalOffsetSeconds = recording.LocalOffset.Seconds,
        Sport = recording.Sport.ToString(),
        ElapsedSeconds = recording.ElapsedSeconds,
        TimerSeconds = recording.TimerSeconds,
        Source = recording.Source,
        Channels = JsonText.Write(recording.Channels.All),
        Samples = recording.Samples,
        Sets = recording.Sets,
        SamplesDigest = recording.SamplesDigest,
        DistanceMetres = recording.DistanceMetres,
        DayBeginsSeconds = (long)recording.DayBegins.TotalSeconds,
    };

    public RecordingSummary ToRecording() => new(
        Sha,
        Part,
        Person,
        Start,
        Offset.FromSeconds(LocalOffsetSeconds),
        LoadWatch.Recordings.Sport.Parse(Sport),
        ElapsedSeconds,
        TimerSeconds,
        Source,
        new ChannelExtents(JsonText.Read<List<ChannelExtent>>(Channels)),
        Samples,
        Sets,
        SamplesDigest)
    {
        DistanceMetres = DistanceMetres,
        DayBegins = Duration.FromSeconds(DayBeginsSeconds),
    };
}
