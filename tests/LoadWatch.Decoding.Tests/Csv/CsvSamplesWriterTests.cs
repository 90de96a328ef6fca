using System.Text;
using CsCheck;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvSamplesWriterTests
{
    [Fact]
    public void TheFormatIsAsDocumented()
    {
        var samples = new SampleSeries(
            [1791180000000, SampleSeries.Undated, 1791180000100],
            new Dictionary<Channel, double[]> { [Channel.Speed] = [3.25, 9, double.NaN], [Channel.HeartRate] = [142, 9, 143] });
        var recording = new Recording { Part = 1, Sport = new Sport("running"), Start = samples.First, LocalOffset = Offset.FromHours(3), Samples = samples };

        Assert.Equal(
            "time,sport,heart_rate_bpm,speed_m_s\n2026-10-05T09:00:00+03:00,running,142,3.25\n2026-10-05T09:00:00.1+03:00,running,143,\n",
            Encoding.UTF8.GetString(CsvSamplesWriter.Write(recording)));
    }

    [Fact]
    public void WhatIsWrittenIsReadBackExactly() =>
        Gen.Select(Gen.Long[0, 4_000_000_000_000], Gen.Double[-1e6, 1e6], Gen.Bool).Array[1, 40]
            .Select(Gen.Int[-720, 840], Gen.Bool)
            .Sample(given =>
            {
                var (rows, offsetMinutes, hasOffset) = given;
                var samples = new SampleSeries(
                    [.. rows.Select(row => row.Item1)],
                    new Dictionary<Channel, double[]>
                    {
                        [Channel.Altitude] = [.. rows.Select(row => row.Item2)],
                        [Channel.Power] = [.. rows.Select((row, index) => row.Item3 || index == 0 ? row.Item2 : double.NaN)],
                    });
                var offset = hasOffset ? Offset.FromSeconds(offsetMinutes * 60) : (Offset?)null;
                var written = new Recording { Part = 1, Sport = new Sport("cycling", "road"), Start = samples.First, LocalOffset = offset, Samples = samples };

                var read = CsvFiles.Only(CsvFiles.Decode(CsvSamplesWriter.Write(written)));

                Assert.Equal(samples.UnixMilliseconds.ToArray(), read.Samples.UnixMilliseconds.ToArray());
                Assert.Equal(samples[Channel.Altitude].ToArray(), read.Samples[Channel.Altitude].ToArray());
                Assert.Equal(samples[Channel.Power].ToArray(), read.Samples[Channel.Power].ToArray());
                Assert.Equal((written.Start, written.LocalOffset, written.Sport), (read.Start, read.LocalOffset, read.Sport));
            });
}
