using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Dates count from 1989-12-31T00:00:00Z. A small count is the device's uptime: no date, unless the file ties its uptime to one.
/// </summary>
internal sealed record FitClock(long? UptimeZero)
{
    public const long EpochUnixSeconds = 631065600;
    private const long FirstDate = 0x10000000 * 1000L;

    public static FitClock Plain { get; } = new((long?)null);

    public static bool IsDate(long? time) => time >= FirstDate;

    /// <summary>The clock that also knows at which <paramref name="date"/> the device's uptime was <paramref name="uptime"/>; the first such pair stands.</summary>
    public FitClock Correlated(long? date, long? uptime) =>
        UptimeZero is null && IsDate(date) && uptime is { } up && !IsDate(up) ? new FitClock(date - up) : this;

    /// <summary>Milliseconds since 1970, or <see cref="SampleSeries.Undated"/>.</summary>
    public long UnixMilliseconds(long time) =>
        time == SampleSeries.Undated ? SampleSeries.Undated
        : time >= FirstDate ? time + (EpochUnixSeconds * 1000)
        : UptimeZero is { } zero ? time + zero + (EpochUnixSeconds * 1000)
        : SampleSeries.Undated;

    /// <summary>Makes a column of the part's times one of milliseconds since 1970.</summary>
    public void ToUnix(long[] times)
    {
        for (var row = 0; row < times.Length; row++)
            times[row] = UnixMilliseconds(times[row]);
    }

    public Instant? Instant(long? time) =>
        time is { } known && UnixMilliseconds(known) is var unix and not SampleSeries.Undated
            ? NodaTime.Instant.FromUnixTimeMilliseconds(unix)
            : null;
}
