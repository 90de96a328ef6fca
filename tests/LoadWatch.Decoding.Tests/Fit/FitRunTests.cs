using CsCheck;
using LoadWatch.Recordings;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Records that follow each other are read field by field, others message by message: what they say is the same.</summary>
public class FitRunTests
{
    private static readonly FitBaseType[] Types = [Unsigned8, Unsigned16, Unsigned32, Signed8, Signed16, Signed32, Real32, Unsigned16Z];
    private static readonly FitDefinition Between = new(0xFF01, new FitFieldLayout(1, Unsigned8));

    private static readonly Gen<double?[]> Row = Gen.Int[0, 120].Select(value => value > 110 ? null : (double?)value).Array[4];

    [Fact]
    public void MessagesBetweenRecordsChangeNothing() =>
        Gen.Select(Row.Array[1, 60], Gen.Int[0, Types.Length - 1].Select(type => Types[type]).Array[4], Gen.Bool).Sample((rows, types, bigEndian) =>
        {
            var definition = Definition(types, bigEndian);

            var together = Write(definition, rows, apart: false).Samples();
            var apart = Write(definition, rows, apart: true).Samples();

            Assert.Equal(apart.UnixMilliseconds, together.UnixMilliseconds);
            Assert.Equal(apart.Channels, together.Channels);
            Assert.All(apart.Channels, channel => Assert.Equal(apart[channel], together[channel]));
        });

    /// <summary>Longer than any block that the rows are kept in; the seventh of ten rows states no heart rate.</summary>
    [Fact]
    public void ALongRunKeepsEveryRowInItsPlace()
    {
        const int Rows = 9000;
        var part = Parts.Begin().DefineRecord();
        for (var row = 0; row < Rows; row++)
        {
            part.Message(0, Parts.Base + row, row % 10 == 6 ? FitValue.None : 60 + (row % 100));
        }

        var samples = part.Samples();

        Assert.Equal(Enumerable.Range(0, Rows), samples.SecondsFromBase());
        Assert.Equal(Enumerable.Range(0, Rows).Select(row => row % 10 == 6 ? double.NaN : 60 + (row % 100)), samples[Channel.HeartRate].ToArray());
    }

    [Fact]
    public void ARecordWithoutATimeInARunIsUndatedAndTheClockGoesOnFromTheLast()
    {
        var part = Parts.Begin().DefineRecord().Define(1, new(20, new FitFieldLayout(3, Unsigned8)))
            .Message(0, Parts.Base + 3, 100).Message(0, FitValue.None, 101).Compressed(1, (Parts.Base + 5) & 31, 102);

        Assert.Equal([3, 5], part.Samples().Take([0, 2]).SecondsFromBase());
        Assert.Equal(SampleSeries.Undated, part.Samples().UnixMilliseconds[1]);
    }

    private static FitDefinition Definition(FitBaseType[] types, bool bigEndian) =>
        new(20, new(253, Unsigned32), new(3, types[0]), new(7, types[1]), new(5, types[2]), new(2, types[3])) { BigEndian = bigEndian };

    private static FitPartWriter Write(FitDefinition definition, double?[][] rows, bool apart)
    {
        var part = Parts.Begin().Define(0, definition).Define(1, Between);
        for (var row = 0; row < rows.Length; row++)
        {
            part.Message(0, Parts.Base + row, rows[row][0], rows[row][1], rows[row][2], rows[row][3]);
            if (apart)
            {
                part.Message(1, 0);
            }
        }

        return part;
    }
}
