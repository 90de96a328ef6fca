using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvTimeTests
{
    private static readonly CsvLayout Layout = BuiltInLayouts.Samples;

    [Theory]
    [InlineData("iso8601", null, "2026-10-05T06:00:00Z", "2026-10-05T06:00:00Z", null)]
    [InlineData("iso8601", null, "2026-10-05T06:00:00.250Z", "2026-10-05T06:00:00.25Z", null)]
    [InlineData("iso8601", null, "\"2026-10-05T06:00:00,5Z\"", "2026-10-05T06:00:00.5Z", null)]
    [InlineData("iso8601", null, "2026-10-05T09:00:00+03:00", "2026-10-05T06:00:00Z", 3)]
    [InlineData("iso8601", null, "2026-10-05 09:00:00+0300", "2026-10-05T06:00:00Z", 3)]
    [InlineData("iso8601", null, "2026-10-05T04:00:00-02", "2026-10-05T06:00:00Z", -2)]
    [InlineData("iso8601", null, "2026-10-05T06:00:00+00:00", "2026-10-05T06:00:00Z", 0)]
    [InlineData("iso8601", null, "2026-10-05 06:00:00", "2026-10-05T06:00:00Z", null)]
    [InlineData("iso8601", "Europe/Helsinki", "2026-10-05T09:00:00", "2026-10-05T06:00:00Z", 3)]
    [InlineData("iso8601", "Europe/Helsinki", "2026-12-05T08:00:00", "2026-12-05T06:00:00Z", 2)]
    [InlineData("iso8601", "Europe/Helsinki", "2026-10-05T06:00:00Z", "2026-10-05T06:00:00Z", 3)]
    [InlineData("iso8601", "Europe/Helsinki", "2026-10-05T07:00:00+01:00", "2026-10-05T06:00:00Z", 1)]
    [InlineData("iso8601", null, "2016-12-31T23:59:60Z", "2016-12-31T23:59:59Z", null)]
    [InlineData("iso8601", null, "2017-01-01 01:59:60.5+02:00", "2016-12-31T23:59:59.5Z", 2)]
    [InlineData("iso8601", "Europe/Helsinki", "2017-01-01T01:59:60", "2016-12-31T23:59:59Z", 2)]
    [InlineData("unix_s", null, "1791180000", "2026-10-05T06:00:00Z", null)]
    [InlineData("unix_s", null, "1791180000.1", "2026-10-05T06:00:00.1Z", null)]
    [InlineData("unix_ms", null, "1791180000100", "2026-10-05T06:00:00.1Z", null)]
    [InlineData("unix_ms", "Europe/Helsinki", "1791180000100", "2026-10-05T06:00:00.1Z", 3)]
    [InlineData("dd.MM.yyyy HH:mm:ss", null, "05.10.2026 06:00:00", "2026-10-05T06:00:00Z", null)]
    [InlineData("MM/dd/yyyy hh:mm:ss tt", "America/New_York", "10/05/2026 02:00:00 AM", "2026-10-05T06:00:00Z", -4)]
    [InlineData("yyyy-MM-dd HH:mm:ss o<+HH:mm>", null, "2026-10-05 09:00:00 +03:00", "2026-10-05T06:00:00Z", 3)]
    public void ATimeIsReadAsTheLayoutWritesIt(string format, string? zone, string cell, string expected, int? offsetHours)
    {
        var layout = Layout with { Time = new CsvTimeColumn { Column = "time", Format = format, Zone = zone } };

        var recording = CsvFiles.Only(CsvFiles.Decode($"time,power_w\n{cell},200\n", layout));

        Assert.Equal(InstantPattern.ExtendedIso.Parse(expected).Value, recording.Start);
        Assert.Equal(offsetHours is { } hours ? Offset.FromHours(hours) : null, recording.LocalOffset);
    }

    [Theory]
    [InlineData("iso8601", "2026-10-05")]
    [InlineData("iso8601", "20261005T060000Z")]
    [InlineData("iso8601", "2026-10-05T06:00:00+03:00:00Z")]
    [InlineData("iso8601", "2026-13-05T06:00:00Z")]
    [InlineData("iso8601", "1791180000")]
    [InlineData("iso8601", "2026-10-05T06:58:60Z")]
    [InlineData("iso8601", "2026-10-05T06:59:61Z")]
    [InlineData("iso8601", "9999-12-31T23:59:59-12:00")]
    [InlineData("iso8601", "-9998-01-01T00:00:00+12:00")]
    [InlineData("iso8601", "0000-01-01T00:00:00")]
    [InlineData("unix_s", "253402300000")]
    [InlineData("unix_s", "1e300")]
    [InlineData("unix_s", "NaN")]
    [InlineData("unix_ms", "-1e18")]
    [InlineData("dd.MM.yyyy HH:mm:ss", "10.31.2026 06:00:00")]
    public void AnotherNotationIsRefused(string format, string cell)
    {
        var layout = Layout with { Time = new CsvTimeColumn { Column = "time", Format = format } };

        var file = CsvFiles.Decode($"time,power_w\n{cell},200\n", layout);

        Assert.Equal("none of 1 rows can be used", CsvFiles.Refusal(file));
        Assert.Equal("line 2, column 1 (time): not a time as the layout writes it", file.Problems[1].ToString());
    }

    [Fact]
    public void ASkippedLocalTimeMovesOnByTheGapAndIsStated()
    {
        // Helsinki, 2027-03-28: from 03:00 straight to 04:00. 03:30 does not exist; moved on by the gap it is 04:30 (+03), 01:30 UTC.
        var file = CsvFiles.Decode("aika;syke\n28.03.2027 03:30:00;100\n28.03.2027 03:30:01;100\n", CsvFiles.Finnish);

        Assert.Equal(Instant.FromUtc(2027, 3, 28, 1, 30), CsvFiles.Only(file).Start);
        var warning = Assert.Single(file.Problems);
        Assert.Equal(ProblemSeverity.Warning, warning.Severity);
        Assert.StartsWith("line 2, column 1 (aika): the local time does not exist in the zone", warning.ToString());
        Assert.EndsWith("(2 rows)", warning.Reason);
    }

    [Fact]
    public void TheHourThatComesTwiceGoesOnWithoutRunningBackwards()
    {
        // Helsinki, 2027-10-31: 03:59:59 (+03, 00:59:59 UTC) is followed by 03:00:00 (+02, 01:00:00 UTC).
        var file = CsvFiles.Decode("aika;syke\n31.10.2027 03:59:58;1\n31.10.2027 03:59:59;2\n31.10.2027 03:00:00;3\n31.10.2027 03:00:01;4\n", CsvFiles.Finnish);

        var times = CsvFiles.Only(file).Samples.UnixMilliseconds.ToArray();
        Assert.Equal([0, 1000, 2000, 3000], times.Select(time => time - times[0]));
        Assert.Equal(Instant.FromUtc(2027, 10, 31, 0, 59, 58).ToUnixTimeMilliseconds(), times[0]);
        Assert.StartsWith("line 2, column 1 (aika): the local time came twice", Assert.Single(file.Problems).ToString());
    }

    [Fact]
    public void SecondsAreCountedFromTheStartColumn()
    {
        var file = CsvFiles.Decode("t,begin,power_w\n0,2026-10-05T09:00:00,200\n0.1,,210\n10,2026-10-05T09:00:00,220\n", FromStart);

        var recording = CsvFiles.Only(file);
        Assert.Equal([1791180000000, 1791180000100, 1791180010000], recording.Samples.UnixMilliseconds.ToArray());
        Assert.Equal(Offset.FromHours(3), recording.LocalOffset);
        Assert.Equal(10, recording.ElapsedSeconds);
    }

    [Theory]
    [InlineData("0,,200", "line 2, column 2 (begin): no start of the session yet")]
    [InlineData("0,soon,200", "line 2, column 2 (begin): not a time as the layout writes it")]
    [InlineData("1:00,2026-10-05T09:00:00,200", "line 2, column 1 (t): not a number of seconds from the start")]
    [InlineData("1e12,2026-10-05T09:00:00,200", "line 2, column 1 (t): not a number of seconds from the start")]
    public void ARowThatCannotBePlacedFromTheStartIsNamed(string row, string expected) =>
        Assert.Equal(expected, CsvFiles.Decode($"t,begin,power_w\n{row}\n", FromStart).Problems[1].ToString());

    [Fact]
    public void ASecondStartIsAnError()
    {
        var file = CsvFiles.Decode("t,begin,power_w\n0,2026-10-05T09:00:00,200\n0,2026-10-05T10:00:00,200\n", FromStart);

        Assert.Equal("line 3, column 2 (begin): another start than in the rows above: one file holds one session", file.Problems[1].ToString());
    }

    private static CsvLayout FromStart { get; } = new()
    {
        Name = "bench",
        Header = ["t", "begin"],
        Time = new CsvTimeColumn { Column = "t", Format = "seconds_from_start", StartColumn = "begin", Zone = "Europe/Helsinki" },
        Columns = [new() { Column = "power_w", Channel = Channel.Power, Unit = "W" }],
    };
}
