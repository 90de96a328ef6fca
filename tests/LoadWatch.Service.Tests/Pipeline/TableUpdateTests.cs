using LoadWatch.Rows;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

public class TableUpdateTests
{
    private static readonly LocalDate First = new(2026, 3, 1);
    private static readonly Instant FirstNight = Instant.FromUtc(2026, 3, 1, 22, 0);

    [Fact]
    public void ThirtyNightsOfAGrowingTableLeaveWhatItsLastExportTells()
    {
        IReadOnlyList<StoredRow> rows = [];
        foreach (var night in Enumerable.Range(0, 30))
        {
            rows = TableUpdate.Apply(rows, Version(night), Table([.. ExportOf(night)]), row => row.Subject);
        }

        var alone = TableUpdate.Apply([], Version(29), Table([.. ExportOf(29)]), row => row.Subject);
        Assert.Equal(Said(alone), Said(rows));
        Assert.Equal(29, rows.Count);
        Assert.Contains(Said(rows), said => said.Contains("\"rating\":9", StringComparison.Ordinal));
    }

    [Fact]
    public void AnExportOfTheLastDaysKeepsWhatIsOlder()
    {
        var rows = TableUpdate.Apply([], Version(9), Table([.. Enumerable.Range(0, 10).Select(day => Row(day, 5))]), _ => "anna");
        rows = TableUpdate.Apply(rows, Version(10), Table(Row(7, 6), Row(10, 5)), _ => "anna");

        Assert.Equal([0, 1, 2, 3, 4, 5, 6, 7, 10], rows.Select(DayOf).Order());
        Assert.Equal(6, Rating(rows.Single(row => DayOf(row) == 7)));
    }

    [Fact]
    public void ATableThatCoversEverythingRetractsItsFirstRowToo()
    {
        var rows = TableUpdate.Apply([], Version(0), Table(Row(0, 5), Row(1, 5)), _ => "anna");
        rows = TableUpdate.Apply(rows, Version(1), Table(Row(1, 5)) with { CoversEverything = true }, _ => "anna");

        Assert.Equal([1], rows.Select(DayOf));
    }

    [Fact]
    public void AVersionWithoutRowsRetractsNothing()
    {
        var rows = TableUpdate.Apply([], Version(0), Table(Row(0, 5)), _ => "anna");

        Assert.Same(rows, TableUpdate.Apply(rows, Version(1), Table(), _ => "anna"));
    }

    [Fact]
    public void AnEditedTableThatWasEmptiedTakesEverythingBack()
    {
        var rows = TableUpdate.Apply([], Version(0), Table(Row(0, 5)), _ => "anna");

        Assert.Empty(TableUpdate.Apply(rows, Version(1), Table() with { CoversEverything = true }, _ => "anna"));
    }

    [Fact]
    public void AnOlderFileOfAFolderThatComesLateTakesNothingBackBehindIt()
    {
        var rows = TableUpdate.Apply([], Version(0), Table(Row(7, 5), Row(8, 5)) with { IsNamedByFolder = true }, _ => "anna");
        rows = TableUpdate.Apply(rows, Version(1), Table(Row(0, 5), Row(1, 5)) with { IsNamedByFolder = true }, _ => "anna");

        Assert.Equal([0, 1, 7, 8], rows.Select(DayOf).Order());
    }

    [Fact]
    public void ARowThatSaysTheSameKeepsItsMoment()
    {
        var rows = TableUpdate.Apply([], Version(0), Table(Row(0, 5), Row(1, 5)), _ => "anna");
        rows = TableUpdate.Apply(rows, Version(1), Table(Row(0, 5), Row(1, 8)), _ => "anna");

        Assert.Equal([Version(0).Since, Version(1).Since], rows.OrderBy(DayOf).Select(row => row.Since));
    }

    [Fact]
    public void ARowWhosePersonIsKnownNowIsWrittenAnew()
    {
        var rows = TableUpdate.Apply([], Version(0), Table(Row(0, 5)), _ => null);

        Assert.Equal("anna", TableUpdate.Apply(rows, Version(1), Table(Row(0, 5)), _ => "anna")[0].Person);
    }

    /// <summary>One row a night; from the twentieth on the row of the fourth day is corrected, from the twenty-fifth that of the ninth, and that of the twelfth is gone from the fifteenth on.</summary>
    private static IEnumerable<TableRow> ExportOf(int night) => Enumerable.Range(0, night + 1)
        .Where(day => !(day == 11 && night >= 14))
        .Select(day => (day, night) switch
        {
            (3, >= 19) => Row(day, 9),
            (8, >= 24) => Row(day, 1),
            _ => Row(day, 5),
        });

    private static TableRow Row(int day, double rating) =>
        new("anna", First.PlusDays(day), $"{day}", new SessionRow(null, null, null, null, 60, rating, [], null), day + 2);

    private static DecodedTable Table(params TableRow[] rows) => new(RowKind.Sessions, "ratings", rows);

    private static TableVersion Version(int night) => new("inbox/ratings.csv", "ratings.csv", $"{night:00}", FirstNight + Duration.FromDays(night), null);

    private static int DayOf(StoredRow row) => Period.DaysBetween(First, row.Date);

    private static double? Rating(StoredRow row) => ((SessionRow)row.Content).Rating;

    private static List<string> Said(IReadOnlyList<StoredRow> rows) =>
        rows.Select(row => $"{row.Date:uuuu-MM-dd} {row.Person} {RowText.Write(row.Content)}").Order(StringComparer.Ordinal).ToList();
}
