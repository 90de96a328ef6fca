using LoadWatch.Recordings;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Developer fields that stand for a field of the profile.</summary>
public class FitDeveloperFieldTests
{
    private const int RecordMessage = 20;
    private const int PowerField = 7;
    private const int SpeedField = 6;
    private static readonly FitFieldLayout Time = new(253, Unsigned32);

    [Fact]
    public void ADeveloperFieldFillsWhereTheProfilesIsAbsent()
    {
        var samples = Described(Parts.Begin(), PowerField, Unsigned16)
            .Define(0, new(RecordMessage, Time, new(7, Unsigned16)) { Developer = [new(0, Unsigned16, 0)] })
            .Message(0, Parts.Base, 200, 300)
            .Message(0, Parts.Base + 1, FitValue.None, 300)
            .Message(0, Parts.Base + 2, FitValue.None, FitValue.None)
            .Samples();
        Assert.Equal([200, 300, double.NaN], samples[Channel.Power]);
    }

    [Fact]
    public void ADescriptionBehindTheDefinitionCounts()
    {
        var part = Parts.Begin()
            .Define(0, new(RecordMessage, Time) { Developer = [new(0, Unsigned16, 0)] })
            .Message(0, Parts.Base, 300);
        var samples = Described(part, PowerField, Unsigned16).Message(0, Parts.Base + 1, 301).Samples();
        Assert.Equal([double.NaN, 301], samples[Channel.Power]);
    }

    [Fact]
    public void ANewDescriptionReplacesTheOld()
    {
        var part = Described(Parts.Begin(), PowerField, Unsigned16)
            .Define(0, new(RecordMessage, Time) { Developer = [new(0, Unsigned16, 0)] })
            .Message(0, Parts.Base, 300);
        var samples = Described(part, SpeedField, Unsigned16).Message(0, Parts.Base + 1, 3).Samples();
        Assert.Equal([300, double.NaN], samples[Channel.Power]);
        Assert.Equal([double.NaN, 3], samples[Channel.Speed]);
    }

    [Theory]
    [InlineData(255, "m/s", 5, 5.0)]
    [InlineData(1, "m/s", 5, 5.0)]
    [InlineData(10, "m/s", 53, 5.3)]
    [InlineData(255, "km/h", 18, 5.0)]
    [InlineData(255, "cm/s", 500, 5.0)]
    [InlineData(255, "mm/s", 5000, 5.0)]
    [InlineData(255, "", 5, 5.0)]
    public void ScaleAndUnitAreApplied(int scale, string unit, double raw, double expected)
    {
        var samples = Described(Parts.Begin(), SpeedField, Unsigned16, scale, unit)
            .Define(0, new(RecordMessage, Time) { Developer = [new(0, Unsigned16, 0)] })
            .Message(0, Parts.Base, raw)
            .Samples();
        Assert.Equal(expected, samples[Channel.Speed][0], 1e-9);
    }

    [Theory]
    [InlineData(SpeedField, "min/km")]
    [InlineData(SpeedField, "bpm")]
    [InlineData(PowerField, "kg")]
    public void AUnitThatTheChannelIsNotKnownInIsNotGuessed(byte field, string unit) =>
        Assert.Empty(Described(Parts.Begin(), field, Unsigned16, 255, unit)
            .Define(0, new(RecordMessage, Time) { Developer = [new(0, Unsigned16, 0)] })
            .Message(0, Parts.Base, 5)
            .Samples()
            .Channels);

    [Fact]
    public void StepsAreTwoToATurnOfTheLegs() =>
        Assert.Equal([90], Described(Parts.Begin(), 4, Unsigned16, 255, "spm")
            .Define(0, new(RecordMessage, Time) { Developer = [new(0, Unsigned16, 0)] })
            .Message(0, Parts.Base, 180)
            .Samples()[Channel.Cadence]);

    [Fact]
    public void FloatsAndBothByteOrdersAreRead()
    {
        var samples = Described(Parts.Begin(), SpeedField, Real32)
            .Define(0, new(RecordMessage, Time) { Developer = [new(0, Real32, 0)], BigEndian = true })
            .Message(0, Parts.Base, 4.25)
            .Samples();
        Assert.Equal([4.25], samples[Channel.Speed]);
    }

    [Fact]
    public void AFieldOfAnotherMessageOrWithoutDescriptionIsPassedOver()
    {
        var samples = Described(Parts.Begin(), PowerField, Unsigned16, message: 18)
            .Define(0, new(RecordMessage, Time, new(3, Unsigned8)) { Developer = [new(0, Unsigned16, 0), new(9, Bytes, 3, 5), new(1, Unsigned8, 0, 0)] })
            .Message(0, Parts.Base, 99, 300)
            .Samples();
        Assert.Equal([Channel.HeartRate], samples.Channels);
    }

    [Fact]
    public void DescriptionsEndWithTheirPart()
    {
        var first = Described(Parts.Begin(), PowerField, Unsigned16).DefineRecord().Message(0, Parts.Base, 99).ToBytes();
        var second = Parts.Begin().Define(0, new(RecordMessage, Time) { Developer = [new(0, Unsigned16, 0)] }).Message(0, Parts.Base, 300).ToBytes();
        var decoded = Parts.Decode(first, second);
        Assert.Equal(2, decoded.Recordings.Count);
        Assert.Empty(decoded.Recordings[1].Samples.Channels);
    }

    [Fact]
    public void WhatTheDeviceStatesItselfCountsAndTheOtherIsShown()
    {
        var recording = Assert.Single(Described(Parts.Begin(), PowerField, Unsigned16)
            .Define(0, new(RecordMessage, Time, new(7, Unsigned16)) { Developer = [new(0, Unsigned16, 0)] })
            .Message(0, Parts.Base, 200, 300)
            .Message(0, Parts.Base + 1, FitValue.None, 310)
            .Message(0, Parts.Base + 2, 220, 340)
            .Decode().Recordings);
        Assert.Equal([200, 310, 220], recording.Samples[Channel.Power]);
        Assert.Equal(new ChannelStatistics(2, 320, 340), Assert.Single(recording.Shadowed.Channels).Value);
    }

    [Fact]
    public void WhatIsShownBelongsToItsSession()
    {
        var recordings = Described(Parts.Begin(), PowerField, Unsigned16)
            .Define(0, new(RecordMessage, Time, new(7, Unsigned16)) { Developer = [new(0, Unsigned16, 0)] })
            .Message(0, Parts.Base, 200, 300)
            .Message(0, Parts.Base + 100, 220, 340)
            .DefineSession().Message(1, Parts.Base, 1, 0, 100_000, 100_000).Message(1, Parts.Base + 100, 2, 0, 1000, 1000)
            .Decode().Recordings;
        Assert.Equal([300, 340], recordings.Select(recording => recording.Shadowed.Channels[Channel.Power].Max));
    }

    [Theory]
    [InlineData(7, "s", 90.5, 90.5)]
    [InlineData(7, "", 90.5, 90.5)]
    [InlineData(8, "min", 1.5, 90.0)]
    [InlineData(8, "ms", 90_500, 90.5)]
    [InlineData(9, "m", 1234.5, 1234.5)]
    [InlineData(9, "km", 1.25, 1250.0)]
    [InlineData(9, "s", 12, null)]
    [InlineData(7, "m", 12, null)]
    [InlineData(7, "s", -1, null)]
    [InlineData(7, "s", double.NaN, null)]
    public void ATotalOfASessionIsFilledInItsUnit(int field, string unit, double written, double? expected)
    {
        var session = Assert.Single(Totals(field, unit).Message(0, Parts.Base, FitValue.None, FitValue.None, FitValue.None, written).Decode().Recordings);
        double?[] totals = [session.ElapsedSeconds, session.TimerSeconds, session.DistanceMetres];
        Assert.Equal(Enumerable.Range(7, 3).Select(number => number == field ? expected : null), totals);
        Assert.Equal(Shadowed.None, session.Shadowed with { Channels = Shadowed.None.Channels });
    }

    [Theory]
    [InlineData(7)]
    [InlineData(8)]
    [InlineData(9)]
    public void ATotalThatTheDeviceStatesItselfCounts(int field)
    {
        var session = Assert.Single(Totals(field, "").Message(0, Parts.Base, 100_000, 90_000, 50_000, 77).Decode().Recordings);
        Assert.Equal((100.0, 90.0, 500.0), (session.ElapsedSeconds, session.TimerSeconds, session.DistanceMetres));
        double?[] shadowed = [session.Shadowed.ElapsedSeconds, session.Shadowed.TimerSeconds, session.Shadowed.DistanceMetres];
        Assert.Equal(Enumerable.Range(7, 3).Select(number => number == field ? 77.0 : (double?)null), shadowed);
    }

    [Fact]
    public void ATotalOfAnotherMessageIsPassedOver() =>
        Assert.Null(Assert.Single(Totals(9, "m", message: 19).Message(0, Parts.Base, FitValue.None, FitValue.None, FitValue.None, 77).Decode().Recordings).DistanceMetres);

    /// <summary>A session with start, elapsed, timer, distance, and a developer field for one of them.</summary>
    private static FitPartWriter Totals(int field, string unit, int message = 18) =>
        Described(Parts.Begin(), field, Real64, unit: unit, message: message)
            .Define(0, new(18, new(2, Unsigned32), new(7, Unsigned32), new(8, Unsigned32), new(9, Unsigned32)) { Developer = [new(0, Real64, 0)] });

    private static FitPartWriter Described(
        FitPartWriter part, int field, FitBaseType type, int scale = 255, string unit = "", int message = RecordMessage) =>
        part
            .Define(14, new(206, new(0, Unsigned8), new(1, Unsigned8), new(2, Unsigned8), new(6, Unsigned8), new(8, Text, 8), new(14, Unsigned16), new(15, Unsigned8)))
            .Message(14, 0, 0, (int)type, scale == 255 ? FitValue.None : scale, unit, message, field);
}
