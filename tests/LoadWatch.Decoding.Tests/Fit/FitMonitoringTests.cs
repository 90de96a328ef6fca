using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Logs of a whole day: walks and runs become recordings, a day without any is rest.</summary>
public class FitMonitoringTests
{
    private const int MonitoringFile = 32;
    private const int Walking = 6;
    private const int Running = 1;

    /// <summary>A full minute and, two hours ahead of UTC, 2021-09-08 04:00 local.</summary>
    private const int Start = Parts.Base + 800;

    private static readonly FitDefinition Info = new(103, new(253, Unsigned32), new(0, Unsigned32));
    private static readonly FitDefinition Steps = new(55, new(26, Unsigned16), new(24, Bytes), new(3, Unsigned32));
    private static readonly FitDefinition FullSteps = new(55, new(253, Unsigned32), new(5, Enumeration), new(3, Unsigned32));
    private static readonly FitDefinition HeartRates = new(55, new(26, Unsigned16), new(27, Unsigned8));

    [Fact]
    public void AWalkOfTenMinutesIsARecording()
    {
        var part = Day();
        Walk(part, fromMinute: 5, minutes: 10, stepsPerMinute: 104, Walking);
        for (var minute = 5; minute < 15; minute++)
            part.Message(2, Short(minute + 1), 90 + minute);

        var recording = Assert.Single(part.Decode().Recordings);
        Assert.Equal(new Sport("walking"), recording.Sport);
        Assert.Equal(Instant.FromUnixTimeSeconds(Start + 300 + 631_065_600L), recording.Start);
        Assert.Equal((600.0, 600.0, Offset.FromHours(2)), (recording.ElapsedSeconds, recording.TimerSeconds, recording.LocalOffset));
        Assert.Equal(new Device(255, 7, 42), recording.Device);
        Assert.Equal(61, recording.Samples.Count);
        Assert.All(recording.Samples[Channel.Cadence].ToArray(), cadence => Assert.Equal(52, cadence));
        Assert.Equal([95, 95, 95, 95, 95, 95, 96], recording.Samples[Channel.HeartRate][..7]);
        Assert.Equal([104, 104], recording.Samples[Channel.HeartRate][^2..]);
    }

    [Theory]
    [InlineData(9, 104, 0)]
    [InlineData(10, 59, 0)]
    [InlineData(10, 60, 1)]
    public void ShortOrSlowWalksAreNone(int minutes, int stepsPerMinute, int recordings)
    {
        var part = Day();
        Walk(part, 5, minutes, stepsPerMinute, Walking);
        Assert.Equal(recordings, part.Decode().Recordings.Count);
    }

    [Theory]
    [InlineData(2, 1)]
    [InlineData(3, 0)]
    public void AHaltOfTwoMinutesDoesNotEndAWalk(int halt, int recordings)
    {
        var part = Day();
        var count = Walk(part, 5, 6, 100, Walking);
        Walk(part, 11 + halt, 6, 100, Walking, count);
        Assert.Equal(recordings, part.Decode().Recordings.Count);
    }

    [Fact]
    public void StepsWrittenLaterBelongToTheMinutesSinceTheCounterWasWritten()
    {
        var part = Day();
        part.Define(3, FullSteps).Message(3, Start + 600, Walking, 0).Message(3, Start + 1500, Walking, 1500);
        var recording = Assert.Single(part.Decode().Recordings);
        Assert.Equal(900, recording.ElapsedSeconds);
        Assert.All(recording.Samples[Channel.Cadence].ToArray(), cadence => Assert.Equal(50, cadence));
    }

    [Fact]
    public void StepsOfALongSilenceBelongToNoMinute()
    {
        var part = Day();
        part.Define(3, FullSteps).Message(3, Start + 600, Walking, 0).Message(3, Start + 600 + (16 * 60), Walking, 1600);
        Assert.Empty(part.Decode().Recordings);
    }

    [Fact]
    public void ALogOfTheFirstMinutesThereAreIsSurvived()
    {
        const int First = 0x1000_0000;
        var part = Day();
        part.Define(3, FullSteps).Message(3, First, Walking, 0).Message(3, First + 60, Walking, 160);
        Assert.Empty(part.Decode().Recordings);
    }

    [Fact]
    public void ACounterThatFellBeganAnew()
    {
        var part = Day();
        part.Define(3, FullSteps).Message(3, Start, Walking, 5000).Message(3, Start + 600, Walking, 800);
        Assert.All(Assert.Single(part.Decode().Recordings).Samples[Channel.Cadence].ToArray(), cadence => Assert.Equal(40, cadence));
    }

    [Fact]
    public void ARunIsCalledSo()
    {
        var part = Day();
        Walk(part, 5, 12, 160, Running);
        Assert.Equal(new Sport("running"), Assert.Single(part.Decode().Recordings).Sport);
    }

    [Fact]
    public void ShortTimesRunOver()
    {
        var part = Day();
        part.Define(3, FullSteps).Message(3, Start, Walking, 0);
        var at = (Start & ~0xFFFF) + 0x1_0000 + 600 - (Start % 60);
        part.Define(4, HeartRates).Message(4, at & 0xFFFF, 61);
        part.Message(3, at - 600, Walking, 10).Message(3, at, Walking, 1010);
        var recording = Assert.Single(part.Decode().Recordings);
        Assert.Equal(61, recording.Samples[Channel.HeartRate][^1]);
    }

    [Fact]
    public void ADayOnWhichTheWatchWasOnlyWornIsRest()
    {
        var decoded = Worn(hours: 12).Decode();
        Assert.Empty(decoded.Recordings);
        Assert.Empty(decoded.Problems);
        var row = Assert.Single(decoded.Table!.Rows);
        Assert.Equal((RowKind.Days, new LocalDate(2021, 9, 8), new DayRow(DayWord.Rest), null), (decoded.Table.Kind, row.Date, row.Content, row.Subject));
        Assert.Equal(new Device(255, 7, 42), Assert.Single(decoded.Worn).Device);
    }

    [Fact]
    public void AWatchWornForLessThanHalfADayTellsNothing() => Assert.Null(Worn(hours: 11).Decode().Table);

    [Fact]
    public void WithoutALocalTimeNoDateIsRest()
    {
        var part = Parts.Begin(MonitoringFile).Define(4, new(55, new(253, Unsigned32), new(27, Unsigned8)));
        for (var hour = 0; hour < 24; hour++)
            part.Message(4, Start + (3600 * hour), 60);

        var decoded = part.Decode();
        Assert.Null(decoded.Table);
        Assert.Empty(decoded.Recordings);
    }

    [Fact]
    public void ADayWithAWalkIsNoRest()
    {
        var part = Worn(hours: 14);
        part.Define(1, Steps);
        Walk(part, 5, 20, 100, Walking);
        var decoded = part.Decode();
        Assert.Single(decoded.Recordings);
        Assert.Null(decoded.Table);
    }

    [Fact]
    public void AWornDateBesideOneWithAWalkIsRestOfItsOwn()
    {
        var part = Day();
        Walk(part, 5, 20, 100, Walking);
        WearUntil(part, hours: 40);
        var decoded = part.Decode();
        Assert.Equal(new LocalDate(2021, 9, 8), Assert.Single(decoded.Recordings).Start!.Value.WithOffset(Offset.FromHours(2)).Date);
        Assert.Equal([new LocalDate(2021, 9, 9)], decoded.Table!.Rows.Select(row => row.Date));
        Assert.Equal(new Device(255, 7, 42), Assert.Single(decoded.Worn).Device);
    }

    [Fact]
    public void AWalkThatBeganBeforeMidnightLeavesTheNextDateRest()
    {
        const int TenBefore = (20 * 60) - 10;
        var part = Day().Message(0, Start + (60 * TenBefore), Start + (60 * TenBefore) + 7200);
        Walk(part, TenBefore, 20, 100, Walking);
        WearUntil(part, hours: 40);
        Assert.Equal([new LocalDate(2021, 9, 9)], part.Decode().Table!.Rows.Select(row => row.Date));
    }

    private static FitPartWriter Day() => Parts.Begin(MonitoringFile)
        .Define(0, Info).Message(0, Start, Start + 7200)
        .Define(1, Steps).Define(2, HeartRates);

    private static FitPartWriter Worn(int hours)
    {
        var part = Day();
        for (var hour = 0; hour < hours; hour++)
            part.Message(2, Short((60 * hour) + 30), 60);

        return part;
    }

    /// <summary>Heart rates of every hour at full times.</summary>
    private static void WearUntil(FitPartWriter part, int hours)
    {
        part.Define(4, new(55, new(253, Unsigned32), new(27, Unsigned8)));
        for (var hour = 1; hour < hours; hour++)
            part.Message(4, Start + (3600 * hour) + 1800, 60);
    }

    /// <summary>Writes the counter at the end of each minute; the answer is where it stands.</summary>
    private static int Walk(FitPartWriter part, int fromMinute, int minutes, int stepsPerMinute, int kind, int count = 0)
    {
        part.Message(1, Short(fromMinute), kind | 0x60, count);
        for (var minute = 1; minute <= minutes; minute++)
            part.Message(1, Short(fromMinute + minute), kind | 0x60, count += stepsPerMinute);

        return count;
    }

    private static int Short(int minute) => (Start + (60 * minute)) & 0xFFFF;
}
