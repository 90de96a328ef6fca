using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>What merging needs to know of a stored recording.</summary>
/// <param name="Sha">SHA-256 of its arrival, 64 lower-case hex digits.</param>
/// <param name="Part">Counts the recordings of the arrival from 1.</param>
/// <param name="Person">Id of the owner.</param>
/// <param name="LocalOffset">The activity's own offset, else the person's zone at its start.</param>
/// <param name="Source">The device or layout that wrote it (I-6): <c>device 255/7/1234</c>, <c>layout own_samples</c>.</param>
/// <param name="Channels">Number of channels that hold readings.</param>
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
    int Channels,
    int Samples,
    int Sets,
    long SamplesDigest)
{
    /// <summary><c>sha/part</c>: the key of the activity that this recording wins.</summary>
    public string Key => $"{Sha}/{Part}";

    /// <summary>The local date that the session counts for.</summary>
    public LocalDate Date => Start.WithOffset(LocalOffset).Date;
}
