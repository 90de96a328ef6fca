using NodaTime;

namespace LoadWatch.Recordings;

/// <summary>Minutes from 9:00 UTC; the recording begins at 0.</summary>
public class SessionWindowTests
{
    [Theory]
    [InlineData(90, 210, "75 225")] // Bus, session, bus.
    [InlineData(-30, 600, "-45 615")]
    [InlineData(0, 240, "-15 255")]
    public void ThePlannedSessionCountsWithAQuarterOfAnHourAround(int start, int end, string expected) =>
        Assert.Equal(expected, Window(240, (start, end)));

    /// <summary>By hand: an hour was planned from 45 min on; of 75 min recorded 30 overlap, half of the shorter.</summary>
    [Theory]
    [InlineData(75, "30 120")]
    [InlineData(74, null)]
    public void ASessionAtTheEdgeIsHeldFromHalfOfTheShorterOn(int length, string? expected) => Assert.Equal(expected, Window(length, (45, 105)));

    [Theory]
    [InlineData(-120, -60)]
    [InlineData(-60, 0)]
    [InlineData(60, 120)]
    public void ASessionBesideTheRecordingIsNotHeld(int start, int end) => Assert.Null(Window(60, (start, end)));

    [Fact]
    public void ARecordingOverTwoSessionsKeepsBoth() => Assert.Equal("-5 165", Window(180, (100, 150), (10, 60), (400, 500)));

    [Fact]
    public void AnotherToleranceCanBeSaid() =>
        Assert.Equal(Given.Start, SessionWindow.Of(Lasting(60), [Planned(0, 60)], Duration.Zero)!.Value.Start);

    [Fact]
    public void WithoutSamplesTheStatedLengthCounts()
    {
        var recording = Given.Recording("soccer", SampleSeries.Empty) with { ElapsedSeconds = 7200 };

        Assert.NotNull(SessionWindow.Of(recording, [Planned(30, 60)]));
        Assert.Null(SessionWindow.Of(recording with { ElapsedSeconds = null }, [Planned(30, 60)]));
        Assert.Null(SessionWindow.Of(recording with { ElapsedSeconds = double.NaN }, [Planned(30, 60)]));
    }

    [Fact]
    public void WithoutAPlanThereIsNoWindow() => Assert.Null(SessionWindow.Of(Lasting(60), []));

    [Fact]
    public void AnOpenIntervalIsNoSession() => Assert.Null(SessionWindow.Of(Lasting(60), [new Interval(Given.Start, null)]));

    private static string? Window(int minutes, params (int Start, int End)[] planned)
    {
        var window = SessionWindow.Of(Lasting(minutes), planned.Select(one => Planned(one.Start, one.End)));
        return window is { } found ? $"{(found.Start - Given.Start).TotalMinutes:0} {(found.End - Given.Start).TotalMinutes:0}" : null;
    }

    private static Interval Planned(int start, int end) =>
        new(Given.Start + Duration.FromMinutes(start), Given.Start + Duration.FromMinutes(end));

    private static Recording Lasting(int minutes) => Given.Recording("soccer", new SampleSeries(
        [Given.StartMilliseconds, Given.StartMilliseconds + (minutes * 60_000L)], new Dictionary<Channel, double[]> { [Channel.HeartRate] = [100, 100] }));
}
