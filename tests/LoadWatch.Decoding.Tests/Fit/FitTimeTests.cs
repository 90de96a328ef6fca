using CsCheck;
using LoadWatch.Recordings;
using NodaTime;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Dates, uptime, compressed times, time zones.</summary>
public class FitTimeTests
{
    private static readonly FitDefinition WithoutTime = new(20, new FitFieldLayout(3, Unsigned8));
    private static readonly FitDefinition Correlation = new(162, new(253, Unsigned32), new(1, Unsigned32));

    [Fact]
    public void CompressedTimesFollowAnySequenceOfStepsUpTo31Seconds() =>
        Gen.Select(Gen.Int[0, 31].Array[0, 50], Gen.Int[0, 1000]).Sample((steps, start) =>
        {
            var part = Parts.Begin().DefineRecord().Message(0, Parts.Base + start, 100).Define(1, WithoutTime);
            var expected = new List<int> { start };
            foreach (var step in steps)
            {
                expected.Add(expected[^1] + step);
                part.Compressed(1, (Parts.Base + expected[^1]) & 31, 100);
            }

            Assert.Equal(expected, part.Samples().SecondsFromBase());
        });

    [Fact]
    public void ATimeInTheMessageStandsBeforeACompressedOne()
    {
        var samples = Parts.Begin().DefineRecord().Message(0, Parts.Base, 100).Compressed(0, 5, Parts.Base + 100, 101).Samples();
        Assert.Equal([0, 100], samples.SecondsFromBase());
    }

    [Fact]
    public void TheTimeOfAnyMessageIsTheReferenceOfTheNextCompressedOne()
    {
        var samples = Parts.Begin()
            .Define(4, new(0xFF01, new FitFieldLayout(253, Unsigned32))).Message(4, Parts.Base + 640)
            .Define(1, WithoutTime).Compressed(1, (Parts.Base + 645) & 31, 100)
            .Samples();
        Assert.Equal([645], samples.SecondsFromBase());
    }

    [Fact]
    public void RecordsWithoutAnyTimeAreKeptUndated()
    {
        var samples = Parts.Begin().Define(1, WithoutTime).Message(1, 100).Compressed(1, 3, 101).Samples();
        Assert.Equal([SampleSeries.Undated, SampleSeries.Undated], samples.UnixMilliseconds);
        Assert.Equal([100, 101], samples[Channel.HeartRate]);
    }

    [Fact]
    public void UptimeIsNoDate()
    {
        var decoded = Parts.Begin().DefineRecord().Message(0, 5000, 100).Message(0, 0x0FFFFFFF, 100)
            .DefineSession().Message(1, 5000, 1, 0, 1000, 1000).Decode();
        var recording = Assert.Single(decoded.Recordings);
        Assert.Null(recording.Start);
        Assert.Equal([SampleSeries.Undated, SampleSeries.Undated], recording.Samples.UnixMilliseconds);
    }

    [Fact]
    public void WhereTheSessionHasNoDateTheFirstDatedSampleStartsIt()
    {
        var decoded = Parts.Begin().DefineRecord().Message(0, 0x0FFFFFFF, 100).Message(0, 0x10000000, 100)
            .DefineSession().Message(1, 5000, 1, 0, 1000, 1000).Decode();
        var start = Assert.Single(decoded.Recordings).Start;
        Assert.Equal(1000L * (0x10000000 + 631_065_600L), start!.Value.ToUnixTimeMilliseconds());
    }

    [Fact]
    public void UptimeBecomesADateWhereTheFileTiesTheTwo()
    {
        var decoded = Parts.Begin().DefineRecord().Message(0, 5010, 100)
            .DefineSession().Message(1, 5005, 1, 0, 1000, 1000)
            .Define(5, Correlation).Message(5, Parts.Base, 5000).Decode();
        var recording = Assert.Single(decoded.Recordings);
        Assert.Equal(Instant.FromUnixTimeMilliseconds(Parts.BaseUnixMilliseconds + 5000), recording.Start);
        Assert.Equal([10], recording.Samples.SecondsFromBase());
    }

    [Theory]
    [InlineData(7200, 7200)]
    [InlineData(7199, 7200)]
    [InlineData(-34201, -34200)]
    [InlineData(20700, 20700)]
    [InlineData(64800, 64800)]
    [InlineData(65701, null)]
    [InlineData(-900000000, null)]
    public void TheLocalOffsetIsStatedToTheQuarterOfAnHour(int difference, int? expected)
    {
        var decoded = Parts.Begin().DefineRecord().Message(0, Parts.Base, 100)
            .Define(6, new(34, new(253, Unsigned32), new(5, Unsigned32))).Message(6, Parts.Base, Parts.Base + difference).Decode();
        Assert.Equal(expected, Assert.Single(decoded.Recordings).LocalOffset?.Seconds);
    }
}
