using System.Text;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvDialectTests
{
    private const string Text = "aika;syke;nopeus (km/h);kierrosmäärä\r\n05.10.2026 09:00:00;142;36,0;90\r\n05.10.2026 09:00:01;143;18,9;\r\n";

    public static TheoryData<string, byte[]> Writings()
    {
        var western = CodePagesEncodingProvider.Instance.GetEncoding(1252)!;
        byte[] Marked(Encoding encoding, string text) => [.. encoding.GetPreamble(), .. encoding.GetBytes(text)];
        byte[] Plain(string text) => new UTF8Encoding(false).GetBytes(text);
        return new()
        {
            { "UTF-8", Plain(Text) },
            { "UTF-8 with a byte order mark", Marked(new UTF8Encoding(true), Text) },
            { "UTF-16 little endian", Marked(new UnicodeEncoding(false, true), Text) },
            { "UTF-16 big endian", Marked(new UnicodeEncoding(true, true), Text) },
            { "Windows-1252", western.GetBytes(Text) },
            { "LF", Plain(Text.Replace("\r\n", "\n")) },
            { "CR", Plain(Text.Replace("\r\n", "\r")) },
            { "no line end at the end", Plain(Text.TrimEnd()) },
            { "blank lines at the end", Plain(Text + "\r\n\r\n  \r\n;;;\r\n") },
            { "blank lines between", Plain(Text.Replace("\r\n", "\r\n\r\n")) },
            { "quoted fields", Plain(Text.Replace("142", "\"142\"").Replace("syke", "\"syke\"").Replace("36,0", "\" 36,0 \"")) },
            { "blanks around", Plain(Text.Replace(";", " ; ")) },
            { "sep line", Plain("sep=;\r\n" + Text) },
            { "sep line with another separator", Plain("sep=|\r\n" + Text.Replace(';', '|')) },
            { "sep line with a tab", Plain("sep=\t\r\n" + Text.Replace(';', '\t')) },
            { "empty cells behind the last column", Plain(Text.Replace(";90", ";90;;")) },
            { "a column of notes with line ends and quotes", Plain(Text.Replace("määrä\r\n", "määrä;huom\r\n").Replace(";90\r\n", ";90;\"a\r\n\"\"b\"\";c\"\r\n").Replace("18,9;\r\n", "18,9;;5\" x\r\n")) },
        };
    }

    [Theory]
    [MemberData(nameof(Writings))]
    public void TheSameTableIsReadHoweverItIsWritten(string writing, byte[] bytes)
    {
        var recording = CsvFiles.Only(CsvFiles.Decode(bytes, CsvFiles.Finnish));

        Assert.NotEmpty(writing);
        // 09:00 in Helsinki in October is 06:00 UTC (summer time, +03); 36 km/h is 10 m/s, 18.9 km/h is 5.25 m/s.
        Assert.Equal(Instant.FromUtc(2026, 10, 5, 6, 0), recording.Start);
        Assert.Equal(Offset.FromHours(3), recording.LocalOffset);
        Assert.Equal([1791180000000, 1791180001000], recording.Samples.UnixMilliseconds.ToArray());
        Assert.Equal([142, 143], recording.Samples[Channel.HeartRate].ToArray());
        Assert.Equal([10, 5.25], recording.Samples[Channel.Speed].ToArray(), (a, b) => Math.Abs(a - b) < 1e-12);
        Assert.Equal([90, double.NaN], recording.Samples[Channel.Cadence].ToArray());
        Assert.Equal(1, recording.ElapsedSeconds);
        Assert.Equal("cycling", recording.Sport.Name);
    }

    [Theory]
    [InlineData("Mittaus 5.10.;Helmi\r\n\r\n\"Laite; 7\"\r\n", 3, 0)]
    [InlineData("sep=;\r\nMittaus 5.10.\r\n", 2, 0)]
    [InlineData("sep=;\r\n", 1, 0)]
    [InlineData("Mittaus 5.10.\r\n", 1, 2)]
    [InlineData("", 0, 1)]
    public void LinesAroundTheNamesArePassedOverWhereTheLayoutSaysSo(string above, int linesAbove, int linesBelow)
    {
        var names = Text.IndexOf('\n') + 1;
        var below = string.Concat(Enumerable.Repeat(";1/min;km/h;1/min\r\n", linesBelow));
        var layout = CsvFiles.Finnish with { LinesAbove = linesAbove, LinesBelow = linesBelow };

        var file = CsvFiles.Decode(above + Text[..names] + below + Text[names..], layout);

        Assert.Empty(file.Problems);
        Assert.Equal([142, 143], CsvFiles.Only(file).Samples[Channel.HeartRate].ToArray());
    }

    [Fact]
    public void ALineThatTheLayoutDoesNotPassOverIsABadRowOnItsLine()
    {
        var file = CsvFiles.Decode("Mittaus\r\n" + Text.Replace("määrä\r\n", "määrä\r\n;1/min;km/h;1/min\r\n"), CsvFiles.Finnish with { LinesAbove = 1 });

        Assert.Equal(3, Assert.Single(file.Problems, problem => problem.Column is not null).Line);
    }

    [Fact]
    public void AFileThatEndsAboveItsNamesIsRefusedWithTheLine()
    {
        var problem = Assert.Single(CsvFiles.Decode(Text, CsvFiles.Finnish with { LinesAbove = 5 }).Problems);

        Assert.Equal(("no line of column names", 6), (problem.Reason, problem.Line));
    }

    [Fact]
    public void TheLayoutNamesTheSource()
    {
        var file = CsvFiles.Decode(Text, CsvFiles.Finnish);

        Assert.Equal("mittaus", file.SourceName);
        Assert.Null(file.FileType);
        Assert.Empty(file.Problems);
    }

    [Fact]
    public void AnEncodingThatTheLayoutNamesIsUsed()
    {
        var layout = CsvFiles.Finnish with { Encoding = "utf-16" };

        var recording = CsvFiles.Only(CsvFiles.Decode(new UnicodeEncoding(false, false).GetBytes(Text), layout));

        Assert.Equal(90, recording.Samples[Channel.Cadence][0]);
    }

    [Fact]
    public void TheSameColumnNamesInTheMiddleAreExplained()
    {
        var file = CsvFiles.Decode("time,heart_rate_bpm\n2026-10-05T06:00:00Z,100\ntime,heart_rate_bpm\n2026-10-05T06:00:01Z,101\n");

        Assert.Equal([100, 101], CsvFiles.Only(file).Samples[Channel.HeartRate].ToArray());
        var warning = Assert.Single(file.Problems);
        Assert.Equal("line 3: the column names come again: rows above and below are taken as one session", warning.ToString());
    }

    [Fact]
    public void OtherColumnNamesInTheMiddleRefuseTheFile()
    {
        var file = CsvFiles.Decode("time,heart_rate_bpm,power_w\n2026-10-05T06:00:00Z,100,200\ntime,power_w,heart_rate_bpm\n2026-10-05T06:00:01Z,200,100\n");

        Assert.Equal("line 3: other column names begin here: two files in one", CsvFiles.Refusal(file));
    }
}
