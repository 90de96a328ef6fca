using CsCheck;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Fit;

/// <summary>What is written is read back.</summary>
public class FitEncoderTests
{
    private static readonly Instant Start = Instant.FromUtc(2024, 3, 9, 6, 30);

    private static readonly Gen<FitSample> Sample =
        Gen.Select(
            Gen.Int[0, 254].Nullable(), Gen.Int[0, 65534].Nullable(), Gen.Int[0, 4000000].Nullable(),
            Gen.Int[0, 254].Nullable(), Gen.Int[0, 100000000].Nullable(), Gen.Int[0, 40000].Nullable(),
            (rate, power, speed, cadence, distance, altitude) =>
                new FitSample(Start, rate, power, speed / 1000.0, cadence, distance / 100.0, (altitude / 5.0) - 500));

    [Fact]
    public void SamplesAreReadBackAsWritten() => Sample.Array[1, 40].Sample(samples =>
    {
        var timed = samples.Select((sample, i) => sample with { Time = Start + Duration.FromSeconds(i * 2) }).ToList();
        var read = Read(new FitActivity { Start = Start, Samples = timed }).Samples;
        Assert.Equal(timed.Select(sample => sample.Time.ToUnixTimeMilliseconds()), read.UnixMilliseconds.ToArray());
        foreach (var channel in Enum.GetValues<Channel>())
            Same([.. timed.Select(sample => Of(sample, channel))], read[channel]);
    });

    [Fact]
    public void TheSessionIsReadBackAsWritten()
    {
        var written = new FitActivity
        {
            Start = Start,
            Sport = new Sport("training", "strength_training"),
            Device = new Device(255, 3, 4_100_000_000),
            LocalOffset = Offset.FromHoursAndMinutes(5, 45),
            ElapsedSeconds = 600,
            Pauses = [new(Start + Duration.FromSeconds(60), Start + Duration.FromSeconds(90))],
            LapStarts = [Start, Start + Duration.FromSeconds(300)],
            Sets =
            [
                new(Start + Duration.FromSeconds(5), 40, true, "leg_curl", 10, 35.5),
                new(Start + Duration.FromSeconds(45), 90, false, null, null, null),
            ],
        };
        var read = Read(written);
        Assert.Equal(written.Sport, read.Sport);
        Assert.Equal(written.Device, read.Device);
        Assert.Equal((written.Start, written.LocalOffset), (read.Start, read.LocalOffset));
        Assert.Equal((600.0, 570.0), (read.ElapsedSeconds, read.TimerSeconds));
        Assert.Equal(written.Pauses, read.Pauses);
        Assert.Equal(written.Sets, read.Sets);
        Assert.Equal(2, read.Laps);
    }

    [Fact]
    public void TheSameActivityAlwaysBecomesTheSameBytes()
    {
        var activity = new FitActivity { Start = Start, Samples = [new(Start, HeartRate: 100), new(Start + Duration.FromSeconds(1), Power: 200)] };
        Assert.Equal(FitEncoder.Encode(activity), FitEncoder.Encode(activity));
    }

    [Fact]
    public void AWordOutsideTheProfileIsNotWritten() =>
        Assert.Throws<ArgumentException>(() => FitEncoder.Encode(new FitActivity { Start = Start, Sport = new("no_such_sport") }));

    [Fact]
    public void AValueThatDoesNotFitIsNotWritten() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => FitEncoder.Encode(new FitActivity { Start = Start, Samples = [new(Start, HeartRate: 300)] }));

    [Theory]
    [InlineData(FitHeaderStyle.Full, 14)]
    [InlineData(FitHeaderStyle.WithoutChecksum, 14)]
    [InlineData(FitHeaderStyle.TwelveBytes, 12)]
    public void EveryLegalHeaderIsRead(FitHeaderStyle style, int size)
    {
        var bytes = Parts.Activity(style);
        Assert.Equal(size, bytes[0]);
        Assert.True(FitDecoder.LooksLikeFit(bytes));
        Assert.Equal(FitCompleteness.Complete, FitDecoder.CheckCompleteness(bytes));
        Assert.Equal([120, 121], Assert.Single(FitDecoder.Decode(bytes).Recordings).Samples[Channel.HeartRate]);
    }

    private static Recording Read(FitActivity activity)
    {
        var decoded = FitDecoder.Decode(FitEncoder.Encode(activity));
        Assert.Empty(decoded.Problems);
        return Assert.Single(decoded.Recordings);
    }

    private static double? Of(FitSample sample, Channel channel) => channel switch
    {
        Channel.HeartRate => sample.HeartRate,
        Channel.Power => sample.Power,
        Channel.Speed => sample.Speed,
        Channel.Cadence => sample.Cadence,
        Channel.Distance => sample.Distance,
        _ => sample.Altitude,
    };

    private static void Same(double?[] written, ReadOnlySpan<double> read)
    {
        if (Array.TrueForAll(written, value => value is null))
            Assert.True(read.IsEmpty);

        for (var i = 0; i < read.Length; i++)
            Assert.Equal(written[i] ?? double.NaN, read[i], 1e-6);
    }
}
