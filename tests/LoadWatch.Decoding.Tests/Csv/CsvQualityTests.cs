using LoadWatch.Decoding.Csv;
using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvQualityTests
{
    private const double None = double.NaN;

    [Fact]
    public void ARowReceivedTooBadlyStaysWithoutItsPosition()
    {
        var recording = CsvFiles.Only(Decode(new CsvQuality { Column = "satellites", AtLeast = 6 }, "6", "5.9", "", "12"));

        Assert.Equal([1, None, None, 4], recording.Samples[Channel.Speed].ToArray());
        Assert.Equal([10, None, None, 40], recording.Samples[Channel.Distance].ToArray());
        Assert.Equal([101.0, 102, 103, 104], recording.Samples[Channel.HeartRate].ToArray());
        Assert.Equal([null, CutReason.MarkedBad, CutReason.MarkedBad, null], recording.Samples[Channel.Speed].ToArray().Select(CutMark.ReasonOf));
    }

    [Fact]
    public void WhereAllPositionsAreBadThatIsToldInsteadOfNothing()
    {
        var samples = CsvFiles.Only(Decode(new CsvQuality { Column = "satellites", AtLeast = 6 }, "1", "2")).Samples;

        Assert.True(samples.Has(Channel.Speed));
        Assert.False(samples.Has(Channel.Altitude));
    }

    [Theory]
    [InlineData(null, 2.0, "1,2,0,x", new[] { 1, 2, 3 })]
    [InlineData(1.0, 2.0, "0.9,1,2,2.1", new[] { 2, 3 })]
    public void TheQualityMayHaveAnUpperLimitOrBoth(double? atLeast, double? atMost, string cells, int[] kept)
    {
        var values = cells.Replace("x", "2.1", StringComparison.Ordinal).Split(',');

        var recording = CsvFiles.Only(Decode(new CsvQuality { Column = "satellites", AtLeast = atLeast, AtMost = atMost }, values));

        Assert.Equal(kept.Select(value => (double)value), recording.Samples[Channel.Speed].ToArray().Where(value => !double.IsNaN(value)));
    }

    [Fact]
    public void OtherChannelsCanBeNamed()
    {
        var quality = new CsvQuality { Column = "satellites", AtLeast = 6, Channels = [Channel.HeartRate] };

        var recording = CsvFiles.Only(Decode(quality, "6", "1"));

        Assert.Equal([101, None], recording.Samples[Channel.HeartRate].ToArray());
        Assert.Equal([1.0, 2], recording.Samples[Channel.Speed].ToArray());
    }

    [Fact]
    public void AQualityThatIsNoNumberIsABadRow() =>
        Assert.Equal(
            "line 2, column 5 (satellites): not a number with the decimal mark .",
            Decode(new CsvQuality { Column = "satellites", AtLeast = 6 }, "good").Problems[1].ToString());

    private static DecodedFile Decode(CsvQuality quality, params string[] cells) => CsvFiles.Decode(
        "time,heart_rate_bpm,speed_m_s,distance_m,satellites\n"
        + string.Concat(cells.Select((cell, row) => $"2026-10-05T06:00:0{row}Z,{101 + row},{1 + row},{10 * (1 + row)},{cell}\n")),
        BuiltInLayouts.Samples with { Quality = quality });
}
