using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvPeopleTests
{
    private static readonly CsvLayout Layout = BuiltInLayouts.Samples with { Name = "squad", Header = ["who"], PersonColumn = "who" };

    [Theory]
    [InlineData("B,2026-10-05T06:00:00Z,1\nA,2026-10-05T06:00:00Z,5\nB,2026-10-05T06:00:01Z,2\nA,2026-10-05T06:00:01Z,6\n")]
    [InlineData("B,2026-10-05T06:00:00Z,1\nB,2026-10-05T06:00:01Z,2\nA,2026-10-05T06:00:00Z,5\nA,2026-10-05T06:00:01Z,6\n")]
    [InlineData("B,2026-10-05T06:00:00Z,1\nA,2026-10-05T06:00:00Z,5\nA,2026-10-05T06:00:01Z,6\n\" B \",2026-10-05T06:00:01Z,2\n")]
    public void EachPersonGetsARecordingInOrderOfFirstAppearance(string rows)
    {
        var file = Decode(rows);

        Assert.Empty(file.Problems);
        Assert.Equal([(1, "B"), (2, "A")], file.Recordings.Select(recording => (recording.Part, recording.Subject!)));
        Assert.Equal([1.0, 2], file.Recordings[0].Samples[Channel.Power].ToArray());
        Assert.Equal([5.0, 6], file.Recordings[1].Samples[Channel.Power].ToArray());
        Assert.All(file.Recordings, recording => Assert.Equal((Instant.FromUtc(2026, 10, 5, 6, 0), 1.0), (recording.Start, recording.ElapsedSeconds)));
    }

    [Fact]
    public void WithoutAColumnOfPeopleTheRecordingIsTheOwnersOfTheFileAndIsNotCut()
    {
        var recording = CsvFiles.Only(CsvFiles.Decode("time,power_w\n2026-10-05T06:00:00Z,1\n2026-10-05T12:00:00Z,2\n"));

        Assert.Equal((null, 2, 21_600.0), (recording.Subject, recording.Samples.Count, recording.ElapsedSeconds));
    }

    [Fact]
    public void ARowThatNamesNobodyIsABadRow()
    {
        var rows = string.Concat(Enumerable.Range(0, 200).Select(row => $"A,2026-10-05T06:{row / 60:00}:{row % 60:00}Z,{row}\n"));

        var file = Decode(rows + ",2026-10-05T07:00:00Z,9\n" + new string('x', 101) + ",2026-10-05T07:00:00Z,9\n");

        Assert.Equal(200, Assert.Single(file.Recordings).Samples.Count);
        Assert.Equal(
            ["line 202, column 1 (who): no person or device", "line 203, column 1 (who): more than 100 characters name no person or device"],
            file.Problems.Select(problem => problem.ToString()));
    }

    [Fact]
    public void ARowTooShortToNameSomebodyIsABadRow()
    {
        var rows = string.Concat(Enumerable.Range(0, 200).Select(row => $"2026-10-05T06:{row / 60:00}:{row % 60:00}Z,{row},A\n"));

        var file = CsvFiles.Decode("time,power_w,who\n" + rows + "2026-10-05T07:00:00Z,9\n", Layout);

        Assert.Equal(200, Assert.Single(file.Recordings).Samples.Count);
        Assert.Equal("line 202: 2 cells for 3 columns", Assert.Single(file.Problems).ToString());
    }

    [Fact]
    public void ABadRowOfOnePersonCountsAgainstTheWholeFile()
    {
        var rows = string.Concat(Enumerable.Range(0, 198).Select(row => $"A,2026-10-05T06:{row / 60:00}:{row % 60:00}Z,{row}\n"));

        Assert.Equal(
            "3 of 201 rows cannot be used, more than 1 %",
            CsvFiles.Refusal(Decode(rows + "B,2026-10-05T06:00:00Z,x\nB,never,1\nB,,1\n")));
    }

    [Fact]
    public void MoreThanAnHourBetweenTwoRowsOfAPersonBeginsARecording()
    {
        var file = Decode(
            "A,2026-10-05T06:00:00Z,1\nB,2026-10-05T06:00:00Z,2\nA,2026-10-05T07:00:00Z,3\nB,2026-10-05T07:00:01Z,4\nB,2026-10-05T07:00:02Z,5\n");

        Assert.Equal([(1, "A", 2), (2, "B", 1), (3, "B", 2)], Shapes(file));
        Assert.Equal(Instant.FromUtc(2026, 10, 5, 7, 0, 1), file.Recordings[2].Start);
        Assert.Equal([4.0, 5], file.Recordings[2].Samples[Channel.Power].ToArray());
    }

    [Fact]
    public void SessionsAreToldApartByTimeWhateverTheOrderOfTheirRows()
    {
        var file = Decode(
            "A,2026-10-05T16:00:01Z,4\nA,2026-10-05T06:00:00Z,1\nA,2026-10-05T16:00:00Z,3\nA,2026-10-05T06:00:01Z,2\n");

        Assert.Equal([(1, "A", 2), (2, "A", 2)], Shapes(file));
        Assert.Equal([1.0, 2], file.Recordings[0].Samples[Channel.Power].ToArray());
        Assert.Equal([4.0, 3], file.Recordings[1].Samples[Channel.Power].ToArray());
    }

    [Fact]
    public void RowsAnHourApartAllTheWayAreNoSessions()
    {
        var layout = Layout with { Time = new CsvTimeColumn { Column = "time", Format = "unix_s" } };
        var rows = string.Concat(Enumerable.Range(0, 2001).Select(row => $"A,{1791180000L + (row * 3601L)},1\n"));

        Assert.Equal("more than 2000 recordings: too many rows lie more than 60 min apart", CsvFiles.Refusal(Decode(rows, layout)));
    }

    [Fact]
    public void MoreThanFiveHundredPeopleAreAColumnThatMeansSomethingElse()
    {
        var rows = string.Concat(Enumerable.Range(0, 600).Select(row => $"{row},2026-10-05T06:00:00Z,1\n"));

        var file = Decode(rows);

        Assert.Equal("100 of 600 rows cannot be used, more than 1 %", CsvFiles.Refusal(file));
        Assert.Equal("line 502, column 1 (who): more than 500 people in one file", file.Problems[1].ToString());
    }

    [Fact]
    public void SecondsFromTheStartTakeTheFirstStartOfTheFileUnlessThePersonHasOne()
    {
        var layout = Layout with { Time = new CsvTimeColumn { Column = "time", Format = "seconds_from_start", StartColumn = "begin" } };
        var file = CsvFiles.Decode(
            "who,time,begin,power_w\nA,0,2026-10-05T06:00:00Z,1\nB,0.1,,2\nC,0,2026-10-05T06:10:00Z,3\nC,1,,4\nB,0.2,,5\n", layout);

        Assert.Empty(file.Problems);
        Assert.Equal([0L, 100, 600_000], file.Recordings.Select(one => one.Samples.UnixMilliseconds[0] - 1791180000000));
        Assert.Equal([100L, 200], file.Recordings[1].Samples.UnixMilliseconds.ToArray().Select(time => time - 1791180000000));
    }

    [Fact]
    public void TheHourThatComesTwiceIsFollowedForEachPerson()
    {
        // Helsinki, 2027-10-31: 03:59:59 (+03, 00:59:59 UTC) is followed by 03:00:00 (+02, 01:00:00 UTC).
        var layout = Layout with { Time = new CsvTimeColumn { Column = "time", Zone = "Europe/Helsinki" } };
        var file = Decode("A,2027-10-31T03:59:59,1\nA,2027-10-31T03:00:00,2\nB,2027-10-31T03:59:59,3\nB,2027-10-31T03:00:00,4\n", layout);

        Assert.All(file.Recordings, recording => Assert.Equal(1, recording.ElapsedSeconds));
        Assert.All(file.Recordings, recording => Assert.Equal(Offset.FromHours(3), recording.LocalOffset));
    }

    [Fact]
    public void OnlyAFileWithTheColumnHasTheLayout()
    {
        var file = CsvFiles.Decode("time,power_w\n2026-10-05T06:00:00Z,1\n", Layout with { Header = ["time"] });

        Assert.StartsWith("line 1: no layout fits", CsvFiles.Refusal(file));
    }

    private static DecodedFile Decode(string rows, CsvLayout? layout = null) => CsvFiles.Decode("who,time,power_w\n" + rows, layout ?? Layout);

    private static IEnumerable<(int Part, string Subject, int Rows)> Shapes(DecodedFile file) =>
        file.Recordings.Select(recording => (recording.Part, recording.Subject!, recording.Samples.Count));
}
