using NodaTime;

namespace LoadWatch.Activities;

/// <summary>Whether two recordings of one person are of the same session (I-9).</summary>
public static class SessionOverlap
{
    /// <summary>How far apart two starts of one session may lie, whatever they overlap: strength sets and points have no length. A choice: two devices
    /// started by one hand.</summary>
    public static Duration StartTolerance { get; } = Duration.FromSeconds(2);

    /// <summary>
    /// They overlap by half of the shorter of the two or more, or start together. A recording without a length overlaps what it lies in. Recordings of
    /// one file only if start and samples are equal: a file knows its own sessions, and tells none twice but by a defect of its writer.
    /// </summary>
    public static bool IsOneSession(RecordingSummary one, RecordingSummary other) => one.Sha == other.Sha
        ? one.Start == other.Start && one.SamplesDigest == other.SamplesDigest
        : StartTogether(one, other) || (Overlap(one, other) && Common(one, other) * 2 >= Duration.Min(Length(one), Length(other)));

    /// <summary>Whether the one can bear on what becomes of the other.</summary>
    public static bool Touch(RecordingSummary one, RecordingSummary other) => StartTogether(one, other) || Overlap(one, other);

    /// <summary>The time that both of them ran.</summary>
    public static Duration Common(RecordingSummary one, RecordingSummary other) =>
        Duration.Max(Duration.Zero, Instant.Min(one.End, other.End) - Instant.Max(one.Start, other.Start));

    public static Duration Length(RecordingSummary one) => one.End - one.Start;

    private static bool StartTogether(RecordingSummary one, RecordingSummary other)
    {
        var apart = one.Start - other.Start;
        return apart <= StartTolerance && -apart <= StartTolerance;
    }

    private static bool Overlap(RecordingSummary one, RecordingSummary other) =>
        Common(one, other) > Duration.Zero || LiesIn(one, other) || LiesIn(other, one);

    private static bool LiesIn(RecordingSummary point, RecordingSummary other) =>
        point.Start == point.End && point.Start >= other.Start && point.Start < other.End;
}
