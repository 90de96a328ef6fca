using LoadWatch.Decoding.Fit;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Benchmarks;

/// <summary>Three hours at 1 Hz with power, heart rate, speed, cadence and distance; deterministic.</summary>
internal static class LongRide
{
    private const int Seconds = 3 * 3600;

    private static readonly Instant Start = Instant.FromUtc(2026, 3, 10, 7, 0);

    public static Person Person { get; } = new("p1", "Ada Example", "g1", 1990, Sex.Female, DateTimeZone.Utc);

    public static AnchorBook Anchors { get; } = new(
    [
        new Anchor("p1", null, AnchorKind.HeartRateRest, 50, AnchorSource.Measured),
        new Anchor("p1", null, AnchorKind.HeartRateMax, 190, AnchorSource.Measured),
        new Anchor("p1", null, AnchorKind.CriticalPower, 250, AnchorSource.Measured),
        new Anchor("p1", null, AnchorKind.WPrime, 20_000, AnchorSource.Measured),
        new Anchor("p1", new LocalDate(2026, 2, 1), AnchorKind.PowerMax, 1000, AnchorSource.Measured),
    ]);

    public static byte[] File() => FitEncoder.Encode(new FitActivity
    {
        Start = Start,
        Sport = new Sport("cycling"),
        Samples = [.. Enumerable.Range(0, Seconds).Select(Sample)],
    });

    private static FitSample Sample(int second)
    {
        var power = 180 + (60 * Math.Sin(second / 90.0)) + (second % 600 < 20 ? 400 : 0);
        return new FitSample(
            Start + Duration.FromSeconds(second),
            HeartRate: (int)(130 + (20 * Math.Sin(second / 200.0))),
            Power: (int)power,
            Speed: 8 + Math.Sin(second / 60.0),
            Cadence: 88,
            Distance: 8.0 * second,
            Altitude: null);
    }
}
