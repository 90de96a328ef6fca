using LoadWatch.Decoding.Csv;
using NodaTime;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvDayTimeTests
{
    private static readonly CsvLayout Layout = BuiltInLayouts.Samples with
    {
        Header = ["day", "time"],
        Time = new CsvTimeColumn { Column = "time", DateColumn = "day", DateFormat = "dd.MM.yyyy", Zone = "Europe/Helsinki" },
    };

    [Fact]
    public void ADateAndATimeOfDayMakeALocalTime()
    {
        var recording = CsvFiles.Only(CsvFiles.Decode("day,time,power_w\n05.10.2026,09:00:00.5,1\n05.10.2026,09:00:01,2\n", Layout));

        Assert.Equal(Instant.FromUtc(2026, 10, 5, 6, 0) + Duration.FromMilliseconds(500), recording.Start);
        Assert.Equal((0.5, Offset.FromHours(3)), (recording.ElapsedSeconds, recording.LocalOffset));
    }

    [Fact]
    public void BelowAnEmptyDateTheDayGoesOnPastMidnight()
    {
        var file = CsvFiles.Decode("day,time,power_w\n05.10.2026,23:59:59,1\n,00:00:00,2\n,00:00:01,3\n,00:00:00.9,4\n", Layout);

        Assert.Equal([0L, 1000, 2000, 1900], FromFirst(CsvFiles.Only(file).Samples.UnixMilliseconds.ToArray()));
        Assert.EndsWith("the time is before that of the row above", Assert.Single(file.Problems).ToString());
    }

    [Fact]
    public void AFilledDateCountsAsItStands()
    {
        var file = CsvFiles.Decode("day,time,power_w\n05.10.2026,23:59:59,1\n06.10.2026,00:00:00,2\n", Layout);

        Assert.Equal([0L, 1000], FromFirst(CsvFiles.Only(file).Samples.UnixMilliseconds.ToArray()));
    }

    [Theory]
    [InlineData("A,05.10.2026,23:59:59,1\nB,,23:59:59,2\nA,,00:00:01,3\nB,,00:00:01,4\n")]
    [InlineData("A,05.10.2026,23:59:59,1\nA,,00:00:01,3\nB,,23:59:59,2\nB,,00:00:01,4\n")]
    public void ADateInTheFirstRowHoldsForEveryPerson(string rows)
    {
        var file = CsvFiles.Decode("who,day,time,power_w\n" + rows, Layout with { PersonColumn = "who" });

        Assert.Empty(file.Problems);
        Assert.Equal(2, file.Recordings.Count);
        Assert.All(file.Recordings, recording => Assert.Equal((Instant.FromUtc(2026, 10, 5, 20, 59, 59), 2.0), (recording.Start, recording.ElapsedSeconds)));
    }

    [Fact]
    public void APersonWhoComesInAfterMidnightIsOfTheNextDay()
    {
        var file = CsvFiles.Decode("who,day,time,power_w\nA,05.10.2026,23:59:59,1\nB,,00:00:01,2\n", Layout with { PersonColumn = "who" });

        Assert.Equal(Instant.FromUtc(2026, 10, 5, 21, 0, 1), file.Recordings[1].Start);
    }

    [Fact]
    public void TheDateOfARowWithABadTimeIsNotLost()
    {
        var rows = string.Concat(Enumerable.Range(0, 120).Select(row => $",09:{row / 60:00}:{row % 60:00},1\n"));

        var file = CsvFiles.Decode("day,time,power_w\n05.10.2026,soon,1\n" + rows, Layout);

        Assert.Equal(Instant.FromUtc(2026, 10, 5, 6, 0), Assert.Single(file.Recordings).Start);
    }

    [Theory]
    [InlineData(",09:00:00,1", "line 2, column 1 (day): no date yet")]
    [InlineData("2026-10-05,09:00:00,1", "line 2, column 1 (day): not a date as the layout writes it")]
    [InlineData("05.10.9999,09:00:00,1", "line 2, column 1 (day): not a date as the layout writes it")]
    [InlineData("05.10.2026,24:00:00,1", "line 2, column 2 (time): not a time of day as the layout writes it")]
    [InlineData("05.10.2026,,1", "line 2, column 2 (time): no time")]
    public void ARowThatCannotBeDatedIsNamed(string row, string expected) =>
        Assert.Equal(expected, CsvFiles.Decode($"day,time,power_w\n{row}\n", Layout).Problems[1].ToString());

    private static IEnumerable<long> FromFirst(long[] times) => times.Select(time => time - times[0]);
}
