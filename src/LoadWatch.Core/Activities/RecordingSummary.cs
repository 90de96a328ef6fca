using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>What merging needs to know of a stored recording.</summary>
/// <param name="Sha">SHA-256 of its arrival, 64 lower-case hex digits.</param>
/// <param name="Part">Counts the recordings of the arrival from 1.</param>
/// <param name="Person">Id of the owner.</param>
/// <param name="LocalOffset">The activity's own offset, else the person's zone at its start.</param>
/// <param name="Source">The device or layout that wrote it (I-6): <c>device 255/7/1234</c>, <c>layout own_samples</c>.</param>
/// <param name="Channels">The channels that hold readings, and from when to when.</param>
/// <param name="Samples">Number of samples.</param>
/// <param name="SamplesDigest">Equal for equal samples, beats of their own and sets (<see cref="Activities.SamplesDigest"/>).</param>
public sealed record RecordingSummary(
    string Sha,
    int Part,
    string Person,
    Instant Start,
    Offset LocalOffset,
    Sport Sport,
    double? ElapsedSeconds,
    double? TimerSeconds,
    string Source,
    ChannelExtents Channels,
    int Samples,
    int Sets,
    long SamplesDigest)
{
    /// <summary>No recording counts as longer when it is compared with others. A choice: a device that was never stopped, and a bound for the search.</summary>
    public static Duration Longest { get; } = Duration.FromHours(48);

    /// <summary>Distance of the session in metres as the session states it, or null.</summary>
    public double? DistanceMetres { get; init; }

    /// <summary><c>sha/part</c>: the key of the activity that this recording wins.</summary>
    public string Key => RecordingKey.Of(Sha, Part);

    /// <summary>When the day of its owner begins, after midnight.</summary>
    public Duration DayBegins { get; init; } = Duration.Zero;

    /// <summary>Its start on a clock that shows midnight when the day of its owner begins (<see cref="People.PersonDay.Clock"/>).</summary>
    public LocalDateTime Clock => (Start - DayBegins).WithOffset(LocalOffset).LocalDateTime;

    /// <summary>The local date that the session counts for.</summary>
    public LocalDate Date => Clock.Date;

    /// <summary>After the elapsed time; where that is unknown with the last usable reading, and without one the start itself.</summary>
    public Instant End => Start + Duration.Max(Duration.Zero, Duration.Min(Longest, Length));

    private Duration Length => (ElapsedSeconds, Channels.Last) switch
    {
        ({ } seconds and > 0, _) when double.IsFinite(seconds) => Duration.FromMilliseconds(Math.Min(Math.Round(seconds * 1000), Longest.TotalMilliseconds)),
        (_, { } last) => Instant.FromUnixTimeMilliseconds(last) - Start,
        _ => Duration.Zero,
    };

    /// <summary>
    /// From when to when a channel has usable readings while the recording ran: a reading with a stray time makes no session of years. Not usable where all
    /// of them lie outside; null where there is no reading.
    /// </summary>
    public ChannelExtent? Extent(Channel channel)
    {
        if (Channels[channel] is not { First: { } first, Last: { } last } extent)
        {
            return Channels[channel];
        }

        var (from, to) = (Math.Max(first, Start.ToUnixTimeMilliseconds()), Math.Min(last, End.ToUnixTimeMilliseconds()));
        return from <= to ? extent with { First = from, Last = to } : extent with { IsUsable = false, First = null, Last = null };
    }
}
