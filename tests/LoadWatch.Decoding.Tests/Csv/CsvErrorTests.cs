using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvErrorTests
{
    private const string Names = "time,heart_rate_bpm\n";

    [Theory]
    [InlineData("2026-10-05T06:59:00Z,14x", "line 202, column 2 (heart_rate_bpm): not a number with the decimal mark .")]
    [InlineData("2026-10-05T06:59:00Z,\"1,234\"", "line 202, column 2 (heart_rate_bpm): not a number with the decimal mark .")]
    [InlineData("2026-10-05T06:59:00Z,1e308", "line 202, column 2 (heart_rate_bpm): beyond any reading")]
    [InlineData("05.10.2026 06:59:00,140", "line 202, column 1 (time): not a time as the layout writes it")]
    [InlineData("2026-02-30T06:59:00Z,140", "line 202, column 1 (time): not a time as the layout writes it")]
    [InlineData(",140", "line 202, column 1 (time): no time")]
    [InlineData("2026-10-05T06:59:00Z", "line 202: 1 cells for 2 columns")]
    [InlineData("2026-10-05T06:59:00Z,140,3", "line 202: 3 cells for 2 columns")]
    [InlineData("2026-10-05T06:59:00Z,\"140\"7", "line 202: text behind a closing quote")]
    public void ABadRowIsNamedWithItsPlaceAndTheOthersCount(string row, string expected)
    {
        var rows = CsvFiles.Rows(400);
        rows.Insert(200, row);

        var file = CsvFiles.Decode(Names + string.Join('\n', rows) + "\n");

        Assert.Equal(400, Assert.Single(file.Recordings).Samples.Count);
        Assert.Equal(expected, Assert.Single(file.Problems).ToString());
        Assert.Equal(ProblemSeverity.Error, file.Problems[0].Severity);
    }

    [Theory]
    [InlineData(99, 1, true)]
    [InlineData(98, 1, false)]
    [InlineData(198, 2, true)]
    [InlineData(197, 2, false)]
    public void MoreThanOneRowInAHundredBadRefusesTheFile(int good, int bad, bool taken)
    {
        var rows = CsvFiles.Rows(good).Concat(Enumerable.Repeat("yesterday,100", bad));

        var file = CsvFiles.Decode(Names + string.Join('\n', rows) + "\n");

        Assert.Equal(taken ? 1 : 0, file.Recordings.Count);
        Assert.Equal(!taken, file.Problems[0].Reason.Contains($"{bad} of {good + bad} rows cannot be used", StringComparison.Ordinal));
    }

    [Fact]
    public void AHundredProblemsAreListedAndTheRestIsCounted()
    {
        var rows = CsvFiles.Rows(3000).SelectMany((row, index) => index % 20 == 0 && index < 2100 ? new[] { row, "x,1" } : [row]);

        var file = CsvFiles.Decode(Names + string.Join('\n', rows) + "\n");

        // 105 bad rows in all: a refusal, a hundred places, and a count of the other five.
        Assert.Equal(102, file.Problems.Count);
        Assert.Equal("105 of 3105 rows cannot be used, more than 1 %", CsvFiles.Refusal(file));
        Assert.Equal("5 more rows have problems like these", file.Problems[^1].ToString());
    }

    [Fact]
    public void AQuotedCellThatSwallowsRowsCountsWithAllOfThem()
    {
        var rows = CsvFiles.Rows(300);
        rows[100] = rows[100].Replace(",", ",\"");
        rows[150] = rows[150].Replace(",", ",\"");

        var file = CsvFiles.Decode(Names + string.Join('\n', rows) + "\n");

        Assert.Equal("51 of 300 rows cannot be used, more than 1 %", CsvFiles.Refusal(file));
        Assert.Equal(102, file.Problems[1].Line);
    }

    [Theory]
    [InlineData("time,heart_rate_bpm\n2026-10-05T06:00:00Z,1\n2026-10-05T06:00:01Z,\"2\n2026-10-05T06:00:02Z,3\n", "line 3: a quote opens here and is never closed")]
    [InlineData("time,heart_rate_bpm\n2026-10-05T06:00:00Z,1\n2026-10-05T06:00:01Z,\0\n", "line 3: a NUL byte: the file is damaged or no text")]
    [InlineData("time,heart_rate_bpm\n", "line 1: no rows below the column names")]
    [InlineData("time,heart_rate_bpm\n,\n", "line 1: no rows below the column names")]
    [InlineData("", "line 1: the file is empty")]
    [InlineData("\n\n", "line 1: the file is empty")]
    [InlineData("sep=,\n", "line 2: no line of column names")]
    [InlineData("sep=\"\nwhen,what\n", "line 1: no layout fits the column names found (sep=\"); layouts known: samples")]
    [InlineData("sep=a\nwhen,what\n", "line 1: no layout fits the column names found (sep=a); layouts known: samples")]
    [InlineData("time,heart_rate_bpm\nx,1\ny,2\n", "none of 2 rows can be used")]
    [InlineData("time,heart_rate_bpm,time\n2026-10-05T06:00:00Z,1,\n", "line 1 (time): two columns have this name")]
    [InlineData("when,what\n1,2\n", "line 1: no layout fits the column names found (when, what); layouts known: samples")]
    [InlineData("\nwhen\u0007,what\n1,2\n", "line 2: no layout fits the column names found (when?, what); layouts known: samples")]
    [InlineData("time,note\n2026-10-05T06:00:00Z,1\n", "line 1: no layout fits the column names found (time, note); layouts known: samples")]
    [InlineData("Time,heart_rate_bpm\n2026-10-05T06:00:00Z,1\n", "line 1: no layout fits the column names found (Time, heart_rate_bpm); layouts known: samples")]
    public void AFileThatCannotBeUsedIsRefusedWithThePlace(string text, string expected) =>
        Assert.Equal(expected, CsvFiles.Refusal(CsvFiles.Decode(text)));

    [Fact]
    public void ALineOfMoreThanAMegabyteRefusesTheFile()
    {
        var text = Names + CsvFiles.Rows(1)[0] + "\n2026-10-05T06:00:01Z," + new string('1', (1 << 20) + 1) + "\n";

        Assert.Equal("line 3: a line is longer than 1 MB", CsvFiles.Refusal(CsvFiles.Decode(text)));
    }

    [Theory]
    [InlineData(',')]
    [InlineData('x')]
    public void AHugeFirstLineIsRefused(char filling) =>
        Assert.Equal("line 1: a line is longer than 1 MB", CsvFiles.Refusal(CsvFiles.Decode("time" + new string(filling, 3 << 20))));

    [Fact]
    public void AMillionColumnNamesAreShownShortened() =>
        Assert.True(CsvFiles.Refusal(CsvFiles.Decode(string.Join(',', Enumerable.Repeat("c", 500_000)))).Length < 400);

    [Fact]
    public void MoreThanTwoMillionRowsAreRefused()
    {
        var layout = BuiltInLayouts.Samples with { Time = new CsvTimeColumn { Column = "time", Format = "unix_s" } };
        var text = new StringBuilder(Names).Insert(Names.Length, "1,2\n", 2_000_001).ToString();

        Assert.Equal("line 2000002: more than 2000000 rows", CsvFiles.Refusal(CsvFiles.Decode(text, layout)));
    }

    [Fact]
    public void RowsThatRunBackwardsAreKeptInOrderAndStated()
    {
        var file = CsvFiles.Decode(Names + "2026-10-05T06:00:01Z,1\n2026-10-05T06:00:00Z,2\n2026-10-05T06:00:02Z,3\n");

        Assert.Equal([1, 2, 3], CsvFiles.Only(file).Samples[Channel.HeartRate].ToArray());
        Assert.Equal("line 3, column 1 (time): the time is before that of the row above", Assert.Single(file.Problems).ToString());
    }

    [Fact]
    public void AnEmptyCellIsNoReading()
    {
        var recording = CsvFiles.Only(CsvFiles.Decode("time,heart_rate_bpm,power_w\n2026-10-05T06:00:00Z,,200\n2026-10-05T06:00:01Z,0,\n"));

        Assert.Equal([double.NaN, 0], recording.Samples[Channel.HeartRate].ToArray());
        Assert.Equal([200, double.NaN], recording.Samples[Channel.Power].ToArray());
        Assert.False(recording.Samples.Has(Channel.Speed));
    }
}
