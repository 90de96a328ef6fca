using CsCheck;
using LoadWatch.Recordings;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>How fields of records become values.</summary>
public class FitFieldTests
{
    private static readonly FitFieldLayout Time = new(253, Unsigned32);

    [Fact]
    public void BothByteOrdersGiveTheSameValues() =>
        Gen.Select(Gen.Int[0, 65534], Gen.Long[0, 4294967294], Gen.Int[0, 254], Gen.Bool).Sample((power, distance, rate, bigEndian) =>
        {
            var samples = Parts.Begin()
                .Define(0, new(20, Time, new(7, Unsigned16), new(5, Unsigned32), new(3, Unsigned8)) { BigEndian = bigEndian })
                .Message(0, Parts.Base, power, distance, rate)
                .Samples();
            Assert.Equal([0], samples.SecondsFromBase());
            Assert.Equal([power], samples[Channel.Power]);
            Assert.Equal(distance / 100.0, samples[Channel.Distance][0], 1e-6);
            Assert.Equal([rate], samples[Channel.HeartRate]);
        });

    [Theory]
    [InlineData(Enumeration, 200)]
    [InlineData(Signed8, -100)]
    [InlineData(Unsigned8, 254)]
    [InlineData(Signed16, -30000)]
    [InlineData(Unsigned16, 65534)]
    [InlineData(Signed32, -2000000000)]
    [InlineData(Unsigned32, 4294967294)]
    [InlineData(Real32, 0.5)]
    [InlineData(Real64, 123456.75)]
    [InlineData(Unsigned8Z, 255)]
    [InlineData(Unsigned16Z, 65535)]
    [InlineData(Unsigned32Z, 4294967295)]
    [InlineData(Bytes, 17)]
    [InlineData(Signed64, -5000000000)]
    [InlineData(Unsigned64, 5000000000)]
    [InlineData(Unsigned64Z, 5000000000)]
    public void TheTypeInTheFileDecidesHowAFieldIsRead(FitBaseType type, double value)
    {
        foreach (var bigEndian in new[] { false, true })
        {
            var samples = Parts.Begin().Define(0, new(20, Time, new(7, type)) { BigEndian = bigEndian })
                .Message(0, Parts.Base, value).Message(0, Parts.Base, FitValue.None).Samples();
            Assert.Equal([value, double.NaN], samples[Channel.Power]);
        }
    }

    [Fact]
    public void WholeNumbersAreScaledAndFractionsAreNot()
    {
        var whole = Parts.Begin().Define(0, new(20, Time, new(6, Unsigned16), new(5, Unsigned32), new(2, Unsigned16)))
            .Message(0, Parts.Base, 3500, 123456, 2600).Samples();
        Assert.Equal((3.5, 1234.56, 20.0), (whole[Channel.Speed][0], whole[Channel.Distance][0], whole[Channel.Altitude][0]));
        var real = Parts.Begin().Define(0, new(20, Time, new(6, Real32))).Message(0, Parts.Base, 3.5).Samples();
        Assert.Equal([3.5], real[Channel.Speed]);
    }

    [Fact]
    public void TheWideFieldStandsBeforeTheNarrowOneWhereverItLies()
    {
        var samples = Parts.Begin()
            .Define(0, new(20, Time, new(6, Unsigned16), new(2, Unsigned16), new(73, Unsigned32), new(78, Unsigned32)))
            .Message(0, Parts.Base, 1000, 2500, 70000, 9500)
            .Message(0, Parts.Base + 1, 1000, 2505)
            .Samples();
        Assert.Equal([70, 1], samples[Channel.Speed]);
        Assert.Equal([1400, 1], samples[Channel.Altitude]);
    }

    [Fact]
    public void OfSeveralValuesInAScalarFieldTheFirstValidOneCounts()
    {
        var samples = Parts.Begin().Define(0, new(20, Time, new(3, Unsigned8, 3), new(7, Unsigned16)))
            .Message(0, Parts.Base, FitValue.Many(null, 131, 140), 200).Samples();
        Assert.Equal([131], samples[Channel.HeartRate]);
        Assert.Equal([200], samples[Channel.Power]);
    }

    [Fact]
    public void ZeroAnd254StayAsRecorded()
    {
        var samples = Parts.Begin().DefineRecord().Message(0, Parts.Base, 0).Message(0, Parts.Base + 1, 254).Message(0, Parts.Base + 2).Samples();
        Assert.Equal([0, 254, double.NaN], samples[Channel.HeartRate]);
    }

    [Fact]
    public void AFieldWhoseSizeDoesNotDivideIsPassedOver()
    {
        var definition = new FitDefinition(20, Time, new(7, Unsigned8, 3), new(3, Unsigned8));
        var bytes = Parts.Begin().Define(0, definition).Message(0, Parts.Base, FitValue.Many(1, 2, 3), 99);
        var samples = FitDecoder.Decode(Patched(bytes.ToBytes(), [7, 3, 0x02], [7, 3, 0x84])).Recordings[0].Samples;
        Assert.False(samples.Has(Channel.Power));
        Assert.Equal([99], samples[Channel.HeartRate]);
    }

    [Fact]
    public void AFieldOfAnUnknownTypeIsPassedOver()
    {
        var part = Parts.Begin().Define(0, new(20, Time, new(7, Unsigned8, 3), new(3, Unsigned8))).Message(0, Parts.Base, FitValue.None, 99);
        var samples = FitDecoder.Decode(Patched(part.ToBytes(), [7, 3, 0x02], [7, 3, 0x1F])).Recordings[0].Samples;
        Assert.Equal([Channel.HeartRate], samples.Channels);
        Assert.Equal([99], samples[Channel.HeartRate]);
    }

    [Fact]
    public void FieldsWithoutBytesAndUnknownMessagesArePassedOver()
    {
        var samples = Parts.Begin()
            .Define(3, new(0xFF00, new FitFieldLayout(1, Text, 20))).Message(3, "of a maker's own")
            .Define(0, new(20, Time, new(7, Unsigned16, 0), new(3, Unsigned8)))
            .Message(3, "again").Message(0, Parts.Base, FitValue.None, 99)
            .Samples();
        Assert.Equal([Channel.HeartRate], samples.Channels);
    }

    [Fact]
    public void ANativeDistanceSetsThePackedSum()
    {
        var samples = Parts.Begin()
            .Define(0, new(20, Time, new(8, Bytes, 3)))
            .Define(1, new(20, Time, new(5, Unsigned32)))
            .Message(1, Parts.Base, 100_000)
            .Message(0, Parts.Base + 1, FitValue.Many(0x2C, 0x01, 0x00))
            .Samples();
        Assert.Equal(1000, samples[Channel.Distance][0]);
        Assert.Equal(1024, samples[Channel.Distance][1]);
    }

    /// <summary>Replaces bytes of a definition and sets the checksum right again.</summary>
    private static byte[] Patched(byte[] file, byte[] from, byte[] to)
    {
        to.CopyTo(file, file.AsSpan().IndexOf(from));
        var crc = FitCrc.Of(file.AsSpan(0, file.Length - 2));
        (file[^2], file[^1]) = ((byte)(crc & 0xFF), (byte)(crc >> 8));
        return file;
    }

    /// <summary>Sums and differences of such numbers would overflow, and one file would stop a whole night.</summary>
    [Fact]
    public void RealNumbersBeyondAnyReadingAreNone()
    {
        var part = Parts.Begin()
            .Define(0, new(20, new(253, Unsigned32), new(3, Unsigned8), new(5, Real64)))
            .Message(0, Parts.Base, 120, 1.7e308)
            .Message(0, Parts.Base + 1, 121, -1.7e308);

        var recording = Assert.Single(part.Decode().Recordings);
        var person = new LoadWatch.People.Person("p", "P", "g", 1990, null, NodaTime.DateTimeZone.Utc);
        var values = LoadWatch.Activities.ActivityComputation.Compute(recording, person, LoadWatch.People.AnchorBook.Empty, new());

        Assert.False(recording.Samples.Has(Channel.Distance));
        Assert.DoesNotContain(values.Quantities, quantity => quantity.Name == "distance");
    }
}
