using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvReadThroughTests
{
    private static readonly CsvLayout Squad = new()
    {
        Name = "squad",
        Header = ["player"],
        PersonColumn = "player",
        Time = new CsvTimeColumn { Column = "time" },
        Columns =
        [
            new() { Column = "speed", Channel = Channel.Speed, Unit = "m/s" },
            new() { Column = "heart rate", Channel = Channel.HeartRate, Unit = "bpm" },
        ],
    };

    [Fact]
    public void EachRecordingIsHandedOnAsItWouldBeKept()
    {
        var handed = new List<Recording>();
        var kept = CsvDecoder.Decode(Whole(new SquadStream(2, 3)), [Squad]);

        var read = CsvDecoder.Read(() => new SquadStream(2, 3), [Squad], handed.Add);

        Assert.Equal((false, 0, "squad"), (read.IsRefused, read.File.Recordings.Count, read.File.SourceName));
        Assert.Equal(kept.Problems, read.File.Problems);
        Assert.Equal([1, 2, 3, 4, 5, 6], handed.Select(recording => recording.Part));
        foreach (var recording in kept.Recordings)
        {
            var same = Assert.Single(handed, one => one.Subject == recording.Subject && one.Start == recording.Start);
            Assert.Equal(recording.ElapsedSeconds, same.ElapsedSeconds);
            Assert.Equal(recording.Samples.UnixMilliseconds.ToArray(), same.Samples.UnixMilliseconds.ToArray());
            Assert.Equal(recording.Samples[Channel.Speed].ToArray(), same.Samples[Channel.Speed].ToArray());
        }
    }

    [Fact]
    public void ASessionIsHandedOnBeforeTheFileEnds()
    {
        var stream = new SquadStream(1, 3);
        var seenAt = new List<long>();

        CsvDecoder.Read(() => stream = new SquadStream(1, 3), [Squad], _ => seenAt.Add(stream.Position));

        Assert.Equal(3, seenAt.Count);
        Assert.InRange(seenAt[0], stream.Length / 3, (stream.Length / 2) + 1);
    }

    [Fact]
    public void ARowThatComesTooLateForItsSessionIsABadRow()
    {
        var rows = string.Concat(Enumerable.Range(0, 300).Select(row => $"A,2026-10-05T{6 + (row / 150 * 4):00}:{row % 150 / 60:00}:{row % 60:00}Z,1,100\n"));
        var bytes = Encoding.ASCII.GetBytes($"player,time,speed,heart rate\n{rows}A,2026-10-05T06:30:00Z,1,100\n");
        var handed = new List<Recording>();

        var read = CsvDecoder.Read(() => new MemoryStream(bytes), [Squad], handed.Add);

        Assert.False(read.IsRefused);
        Assert.Equal([150, 150], handed.Select(recording => recording.Samples.Count));
        Assert.StartsWith("line 302: of a session whose rows had come to an end above", Assert.Single(read.File.Problems, problem => problem.Severity == ProblemSeverity.Error).ToString());
    }

    [Fact]
    public void WhatWasHandedOnDoesNotCountWhereTheFileIsRefusedAtItsEnd()
    {
        var bytes = Encoding.ASCII.GetBytes("player,time,speed,heart rate\nA,2026-10-05T06:00:00Z,1,100\nA,2026-10-05T09:00:00Z,1,100\nA,2026-10-05T09:00:01Z,x,100\n");
        var handed = new List<Recording>();

        var read = CsvDecoder.Read(() => new MemoryStream(bytes), [Squad], handed.Add);

        Assert.True(read.IsRefused);
        Assert.Single(handed);
        Assert.Equal("1 of 3 rows cannot be used, more than 1 %", read.File.Problems[0].Reason);
    }

    [Fact]
    public void ATableIsReadThroughToItsRows()
    {
        var bytes = "date,person,day\n2026-03-31,aada,rest\n"u8.ToArray();

        var read = CsvDecoder.Read(() => new MemoryStream(bytes), BuiltInLayouts.All, _ => Assert.Fail("a table holds no recording"));

        Assert.False(read.IsRefused);
        Assert.Single(read.File.Table!.Rows);
    }

    [Fact]
    public void AStreamIsReadAsItsBytesAreWhateverItsEncoding()
    {
        // Long enough for letters to lie across the reads of the check for UTF-8.
        var text = "time;Kommentar;Puls\n" + string.Concat(Enumerable.Range(0, 20_000).Select(row => $"2026-10-05T{row / 3600:00}:{row / 60 % 60:00}:{row % 60:00}Z;ä€😀;120\n"));
        var layout = BuiltInLayouts.Samples with { Delimiter = ';', Columns = [new() { Column = "Puls", Channel = Channel.HeartRate, Unit = "bpm" }] };
        foreach (var bytes in new[] { Encoding.UTF8.GetBytes(text), Encoding.Latin1.GetBytes(text), [0xFF, 0xFE, .. Encoding.Unicode.GetBytes(text)] })
        {
            var one = CsvDecoder.Decode(bytes, [layout]);
            var handed = new List<Recording>();
            var read = CsvDecoder.Read(() => new MemoryStream(bytes), [layout], handed.Add);

            Assert.Equal(one.Problems, read.File.Problems);
            Assert.Equal(CsvFiles.Only(one).Samples.Count, Assert.Single(handed).Samples.Count);
        }
    }

    private static byte[] Whole(Stream stream)
    {
        using var copy = new MemoryStream();
        stream.CopyTo(copy);
        return copy.ToArray();
    }
}
