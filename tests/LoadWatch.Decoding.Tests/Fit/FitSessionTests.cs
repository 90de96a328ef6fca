using LoadWatch.Recordings;
using NodaTime;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>What becomes a recording, and what belongs to it.</summary>
public class FitSessionTests
{
    private const int Swimming = 5;
    private const int Cycling = 2;
    private static readonly FitDefinition Beats = new(132, new(253, Unsigned32), new(0, Unsigned16), new(9, Unsigned32), new(6, Unsigned8));
    private static readonly FitDefinition TimerEvent = new(21, new(253, Unsigned32), new(0, Enumeration), new(1, Enumeration));
    private static readonly FitDefinition Starts = new(19, new FitFieldLayout(2, Unsigned32));
    private static readonly FitDefinition Sets = new(225,
        new(254, Unsigned32), new(6, Unsigned32), new(0, Unsigned32), new(3, Unsigned16), new(4, Unsigned16), new(5, Unsigned8), new(7, Unsigned16, 3));

    [Fact]
    public void EachRecordBelongsToTheLastSessionBegunElseTheFirst()
    {
        var decoded = Parts.Begin().DefineRecord()
            .Message(0, Parts.Base - 5, 90).Message(0, Parts.Base, 91).Message(0, Parts.Base + 9, 92).Message(0, Parts.Base + 10, 93)
            .Message(0, FitValue.None, 94).Message(0, Parts.Base + 500, 95).Message(0, Parts.Base + 3, 96)
            .DefineSession().Message(1, Parts.Base + 10, Cycling, 7, 1, 1).Message(1, Parts.Base, Swimming, 18, 1, 1)
            .Decode();
        Assert.Equal(["cycling/road", "swimming/open_water"], decoded.Recordings.Select(recording => recording.Sport.ToString()));
        Assert.Equal([1, 2], decoded.Recordings.Select(recording => recording.Part));
        Assert.Equal([93, 94, 95], decoded.Recordings[0].Samples[Channel.HeartRate]);
        Assert.Equal([90, 91, 92, 96], decoded.Recordings[1].Samples[Channel.HeartRate]);
    }

    [Fact]
    public void LapsLengthsSetsBeatsAndPausesGoWithTheirSession()
    {
        var decoded = Parts.Begin()
            .DefineSession().Message(1, Parts.Base, Cycling, 0, 1, 1).Message(1, Parts.Base + 100, Swimming, 0, 1, 1)
            .Define(2, Starts).Message(2, Parts.Base).Message(2, Parts.Base + 100).Message(2, Parts.Base + 150)
            .Define(3, new(101, new FitFieldLayout(2, Unsigned32))).Message(3, Parts.Base + 120)
            .Define(4, Sets).Message(4, FitValue.None, Parts.Base + 40, 1)
            .Define(5, Beats).Message(5, Parts.Base + 99, 0, 0, 80).Message(5, Parts.Base + 100, 0, 1024, 81)
            .Define(6, TimerEvent).Message(6, Parts.Base + 110, 0, 4).Message(6, Parts.Base + 115, 0, 0)
            .Decode();
        var (first, second) = (decoded.Recordings[0], decoded.Recordings[1]);
        Assert.Equal((1, 0, 1, 0), (first.Laps, first.Lengths, first.Sets.Count, first.Pauses.Count));
        Assert.Equal((2, 1, 0, 1), (second.Laps, second.Lengths, second.Sets.Count, second.Pauses.Count));
        Assert.Equal([80], first.LateHeartRates.Select(beat => beat.BeatsPerMinute));
        Assert.Equal([81], second.LateHeartRates.Select(beat => beat.BeatsPerMinute));
    }

    [Fact]
    public void ASessionStatesStartAndTotals()
    {
        var recording = Assert.Single(Parts.Begin().DefineRecord().Message(0, Parts.Base + 3, 90)
            .DefineSession().Message(1, Parts.Base, 1, 255, 61_500, 60_250).Decode().Recordings);
        Assert.Equal(Instant.FromUnixTimeMilliseconds(Parts.BaseUnixMilliseconds), recording.Start);
        Assert.Equal((61.5, 60.25), (recording.ElapsedSeconds, recording.TimerSeconds));
        Assert.Equal(new Sport("running"), recording.Sport);
    }

    [Fact]
    public void RecordsWithoutSessionMakeOneRecordingOfTheStatedSport()
    {
        var recording = Assert.Single(Parts.Begin()
            .Define(1, new(12, new(0, Enumeration), new(1, Enumeration))).Message(1, Cycling, 6)
            .DefineRecord().Message(0, Parts.Base + 7, 90).Message(0, Parts.Base, 90).Decode().Recordings);
        Assert.Equal(new Sport("cycling", "indoor_cycling"), recording.Sport);
        Assert.Equal(Instant.FromUnixTimeMilliseconds(Parts.BaseUnixMilliseconds), recording.Start);
        Assert.Equal((7.0, null), (recording.ElapsedSeconds, recording.TimerSeconds));
    }

    [Fact]
    public void UnknownSportsAreNamedByTheirNumber()
    {
        var recording = Assert.Single(Parts.Begin().DefineSession().Message(1, Parts.Base, 99, 200, 1, 1).Decode().Recordings);
        Assert.Equal(new Sport("sport_99", "sub_sport_200"), recording.Sport);
        Assert.Equal(0, recording.Samples.Count);
    }

    [Fact]
    public void ACourseHoldsNoRecording()
    {
        var decoded = Parts.Begin(fileType: 6).DefineRecord().Message(0, Parts.Base, 90).Decode();
        Assert.Equal("course", decoded.FileType);
        Assert.Empty(decoded.Recordings);
        Assert.Empty(decoded.Problems);
    }

    [Fact]
    public void AnUnknownFileTypeWithRecordsIsTraining()
    {
        var decoded = Parts.Begin(fileType: 132).DefineRecord().Message(0, Parts.Base, 90).Decode();
        Assert.Equal("file_132", decoded.FileType);
        Assert.Single(decoded.Recordings);
    }

    [Fact]
    public void AnActivityBehindSettingsNamesTheFile()
    {
        var decoded = Parts.Decode(Parts.Begin(fileType: 2).ToBytes(), Parts.Activity(), Parts.Activity(FitHeaderStyle.TwelveBytes, heartRate: 140));
        Assert.Equal("activity", decoded.FileType);
        Assert.Equal([1, 2], decoded.Recordings.Select(recording => recording.Part));
        Assert.Equal([140, 141], decoded.Recordings[1].Samples[Channel.HeartRate]);
    }

    [Fact]
    public void PartsOfBeatsBelongToTheActivityBeforeThem()
    {
        var first = new FitPartWriter().Define(0, Beats).Message(0, Parts.Base + 1, 0, 5000, 70).ToBytes();
        var second = new FitPartWriter().Define(0, Beats).Message(0, Parts.Base, 16384, 9000, 71).ToBytes();
        var decoded = Parts.Decode(first, Parts.Activity(), first, second, Parts.Activity());
        Assert.Equal([2, 0], decoded.Recordings.Select(recording => recording.LateHeartRates.Count));
        Assert.Equal(
            [new(Parts.BaseUnixMilliseconds + 500, 71), new TimedHeartRate(Parts.BaseUnixMilliseconds + 1000, 70)],
            decoded.Recordings[0].LateHeartRates);
    }

    [Fact]
    public void TheStrapsClockMayRunOver()
    {
        var decoded = Parts.Begin().DefineRecord().Message(0, Parts.Base, 90)
            .Define(5, Beats).Message(5, Parts.Base, 0, 4294967294, 70).Message(5, FitValue.None, FitValue.None, 1023, 71).Decode();
        Assert.Equal([0, 1000], decoded.Recordings[0].LateHeartRates.Select(beat => beat.UnixMilliseconds - Parts.BaseUnixMilliseconds));
    }

    /// <summary>One layout for all messages: those that follow the anchor leave its full time open, and the slots that were not filled.</summary>
    [Fact]
    public void BeatsOfOneLayoutAreReadFromTheSlotsThatAreFilled()
    {
        var layout = new FitDefinition(132, new(253, Unsigned32), new(9, Unsigned32), new(6, Unsigned8, 4), new(10, Bytes, 6));
        var decoded = Parts.Begin().DefineRecord().Message(0, Parts.Base, 90).Define(5, layout)
            .Message(5, Parts.Base, 1024, FitValue.Many(70, null, null, null), FitValue.Many(null, null, null, null, null, null))
            .Message(5, FitValue.None, FitValue.None, FitValue.Many(71, 72, null, null), FitValue.Many(0, 8, 192, null, null, null))
            .Message(5, FitValue.None, FitValue.None, FitValue.Many(73, null, null, null), FitValue.Many(0, 240, 255, null, null, null))
            .Decode();

        Assert.Equal(
            [(0, 70), (1000, 71), (2000, 72), (3000, 73)],
            decoded.Recordings[0].LateHeartRates.Select(beat => ((int)(beat.UnixMilliseconds - Parts.BaseUnixMilliseconds), beat.BeatsPerMinute)));
    }

    [Fact]
    public void SetsAreReadInTheirUnits()
    {
        var decoded = Parts.Begin().Define(4, Sets)
            .Message(4, Parts.Base + 30, Parts.Base, 30_500, 8, 1000, 1, FitValue.Many(null, 28, 0))
            .Message(4, Parts.Base + 90, FitValue.None, 60_000, FitValue.None, FitValue.None, 0, FitValue.Many(65534))
            .Message(4, Parts.Base + 95, FitValue.None, FitValue.None, FitValue.None, FitValue.None, 1, FitValue.Many(500))
            .Decode();
        var start = Instant.FromUnixTimeMilliseconds(Parts.BaseUnixMilliseconds);
        Assert.Equal(
            [
                new(start, 30.5, true, "squat", 8, 62.5),
                new(start + Duration.FromSeconds(90), 60, false, null, null, null),
                new StrengthSet(start + Duration.FromSeconds(95), null, true, "exercise_category_500", null, null),
            ],
            Assert.Single(decoded.Recordings).Sets);
    }

    /// <summary>The profile's scale belongs to whole numbers; a file may declare another type.</summary>
    [Theory]
    [InlineData(Real32)]
    [InlineData(Real64)]
    public void RealNumbersAreNotScaled(FitBaseType type)
    {
        var session = Assert.Single(Parts.Begin()
            .Define(1, new(18, new(2, Unsigned32), new(7, type), new(8, type), new(9, type))).Message(1, Parts.Base, 3600.5, 3500.25, 10_000.5)
            .Define(4, new(225, new(254, Unsigned32), new(0, type), new(4, type), new(5, Unsigned8))).Message(4, Parts.Base + 30, 30.5, 62.5, 1)
            .Decode().Recordings);
        Assert.Equal((3600.5, 3500.25, 10_000.5), (session.ElapsedSeconds, session.TimerSeconds, session.DistanceMetres));
        Assert.Equal((30.5, 62.5), (Assert.Single(session.Sets).DurationSeconds, session.Sets[0].Kilograms));
    }

    [Fact]
    public void AStopThatNothingFollowsIsNoPause()
    {
        var part = Parts.Begin().Define(6, TimerEvent).DefineRecord()
            .Message(6, Parts.Base, 0, 0).Message(0, Parts.Base, 90)
            .Message(6, Parts.Base + 10, 0, 1).Message(6, Parts.Base + 12, 0, 4).Message(6, Parts.Base + 20, 0, 0)
            .Message(0, Parts.Base + 30, 90).Message(6, Parts.Base + 30, 0, 9).Message(6, Parts.Base + 31, 8, 0);
        var pause = Assert.Single(Assert.Single(part.Decode().Recordings).Pauses);
        Assert.Equal(Duration.FromSeconds(10), pause.End - pause.Start);
        var open = Assert.Single(part.Message(0, Parts.Base + 40, 90).Decode().Recordings).Pauses;
        Assert.Equal([pause, new Pause(pause.Start + Duration.FromSeconds(20), null)], open);
    }

    [Fact]
    public void TheDeviceFillsWhatTheFilesOwnWordsLeaveOpen()
    {
        var decoded = new FitPartWriter().Define(15, new(0, new(0, Enumeration), new(1, Unsigned16), new(2, Unsigned16))).Message(15, 4, FitValue.None, 7)
            .Define(2, new(23, new(0, Unsigned8), new(2, Unsigned16), new(4, Unsigned16), new(3, Unsigned32Z)))
            .Message(2, 1, 9, 9, 9).Message(2, 0, 8, 12, 4000000000)
            .DefineRecord().Message(0, Parts.Base, 90).Decode();
        Assert.Equal(new Device(8, 7, 4000000000), Assert.Single(decoded.Recordings).Device);
    }
}
