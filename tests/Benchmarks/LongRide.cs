using LoadWatch.Decoding.Fit;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Benchmarks;

/// <summary>Three hours at 1 Hz with power, heart rate, speed, cadence and distance; deterministic.</summary>
internal static class LongRide
{
    public const int Seconds = 3 * 3600;

    private const int FileId = 0;
    private const int ActivityFile = 4;
    private const int Record = 20;
    private const int FieldDescription = 206;
    private const int Cadence = 4;
    private const long FitEpoch = 631065600;

    /// <summary>Time, latitude, longitude, altitude, distance, speed, accumulated power, power, grade, heart rate, cadence, temperature.</summary>
    private static readonly (byte Number, FitBaseType Type)[] Fields =
    [
        (253, FitBaseType.Unsigned32),
        (0, FitBaseType.Signed32),
        (1, FitBaseType.Signed32),
        (78, FitBaseType.Unsigned32),
        (5, FitBaseType.Unsigned32),
        (73, FitBaseType.Unsigned32),
        (29, FitBaseType.Unsigned32),
        (7, FitBaseType.Unsigned16),
        (9, FitBaseType.Signed16),
        (3, FitBaseType.Unsigned8),
        (4, FitBaseType.Unsigned8),
        (13, FitBaseType.Signed8),
    ];

    /// <summary>Developer, field, base type, name, scale, unit, and the message and field of the profile that it stands for.</summary>
    private static readonly (byte Number, FitBaseType Type, int Count)[] Description =
    [
        (0, FitBaseType.Unsigned8, 1),
        (1, FitBaseType.Unsigned8, 1),
        (2, FitBaseType.Unsigned8, 1),
        (3, FitBaseType.Text, 12),
        (6, FitBaseType.Unsigned8, 1),
        (8, FitBaseType.Text, 12),
        (14, FitBaseType.Unsigned16, 1),
        (15, FitBaseType.Unsigned8, 1),
    ];

    private static readonly Instant Start = Instant.FromUtc(2026, 3, 10, 7, 0);

    public static LocalDate Date { get; } = new(2026, 3, 10);

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

    /// <summary>The same ride as a device writes it that knows its place and temperature too.</summary>
    public static byte[] FileOfTwelveFields() => TwelveFields([]);

    /// <summary>The same with two developer fields in every record: one that stands for the profile's cadence, one with a scale that is nobody's but its maker's.</summary>
    public static byte[] FileWithDeveloperFields() => TwelveFields([new(0, FitBaseType.Unsigned8, 0), new(1, FitBaseType.Unsigned16, 0)]);

    private static byte[] TwelveFields(IReadOnlyList<FitDeveloperLayout> developer)
    {
        var writer = new FitPartWriter()
            .Define(0, new(FileId, new FitFieldLayout(0, FitBaseType.Enumeration)))
            .Message(0, ActivityFile)
            .Define(2, new(FieldDescription, [.. Description.Select(field => new FitFieldLayout(field.Number, field.Type, field.Count))]))
            .Message(2, 0, 0, 0x02, "turns", 1, "rpm", Record, Cadence)
            .Message(2, 0, 1, 0x84, "balance", 100, "percent", Record, FitValue.None)
            .Define(1, new(Record, [.. Fields.Select(field => new FitFieldLayout(field.Number, field.Type))]) { Developer = developer });
        for (var second = 0; second < Seconds; second++)
        {
            var sample = Sample(second);
            FitValue[] values =
            [
                Start.ToUnixTimeSeconds() - FitEpoch + second,
                600_000_000 + (second * 90),
                100_000_000 + (second * 40),
                (500 + (100 + (20 * Math.Sin(second / 900.0)))) * 5,
                sample.Distance * 100,
                sample.Speed * 1000,
                second * 190L,
                sample.Power,
                100 * Math.Sin(second / 900.0),
                sample.HeartRate,
                sample.Cadence,
                17,
            ];
            writer.Message(1, [.. values, .. developer.Select((_, field) => FitValue.Of(field == 0 ? 88 : 5000 + (second % 100)))]);
        }

        return writer.ToBytes();
    }

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
