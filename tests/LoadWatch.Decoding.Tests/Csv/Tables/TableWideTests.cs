using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Tests.Csv.Tables;

/// <summary>Lines that hold several rows side by side, and fields that are the same in all of them.</summary>
public class TableWideTests
{
    private static readonly CsvLayout BySet = new()
    {
        Name = "sheet",
        Kind = CsvKind.Sets,
        Header = ["Tag", "Übung"],
        PersonColumn = "Wer",
        DateColumn = "Tag",
        Fields = [TableFiles.Field("Übung", "exercise")],
        Wide =
        [
            new() { Set = 1, Fields = [TableFiles.Field("Satz 1 kg", "kilograms"), TableFiles.Field("Satz 1 Wdh", "repetitions")] },
            new() { Set = 2, Fields = [TableFiles.Field("Satz 2 kg", "kilograms"), TableFiles.Field("Satz 2 Wdh", "repetitions")] },
            new() { Set = 3, Constants = Pairs(("fast", "yes")), Fields = [TableFiles.Field("Satz 3 kg", "kilograms")] },
        ],
    };

    private static readonly CsvLayout ByPerson = new()
    {
        Name = "form",
        Kind = CsvKind.Sessions,
        Header = ["date"],
        DateColumn = "date",
        Fields = [TableFiles.Field("dauer", "minutes")],
        Constants = Pairs(("sport", "soccer")),
        Wide =
        [
            new() { Person = "anna", Fields = [TableFiles.Field("Anna", "rating")] },
            new() { Person = "ben", Fields = [TableFiles.Field("Ben", "rating")] },
        ],
    };

    private static readonly CsvLayout ByTest = new()
    {
        Name = "clinic",
        Kind = CsvKind.Tests,
        Header = ["Name", "Tag"],
        Decimal = ',',
        Delimiter = ';',
        PersonColumn = "Name",
        DateColumn = "Tag",
        Wide =
        [
            new() { Test = "grip_strength", Unit = "kg", Hand = "left", Fields = [TableFiles.Field("Kraft links", "value")] },
            new() { Test = "grip_strength", Unit = "kg", Hand = "right", Fields = [TableFiles.Field("Kraft rechts", "value")] },
            new() { Test = "walk_400_m", Fields = [TableFiles.Field("400 m", "value", "m:ss"), TableFiles.Field("Ausgang", "outcome")] },
        ],
    };

    [Fact]
    public void EverySetOfALineIsARow()
    {
        var rows = TableFiles.Rows("Tag,Wer,Übung,Satz 1 kg,Satz 1 Wdh,Satz 2 kg,Satz 2 Wdh,Satz 3 kg\n2026-10-05,aada,squat,80,8,85,6,60\n", BySet);

        Assert.Equal(
            [(1, 80.0, 8, false), (2, 85, 6, false), (3, 60, null, true)],
            rows.Select(row => (SetRow)row.Content).Select(set => (set.Set, set.Kilograms, set.Repetitions, set.IsFast)));
        Assert.All(rows, row => Assert.Equal(("aada", new LocalDate(2026, 10, 5), 2L), (row.Subject, row.Date, row.Line)));
    }

    [Fact]
    public void ASetWhoseCellsAreEmptyMakesNoRow()
    {
        var rows = TableFiles.Rows("Tag,Übung,Satz 1 kg,Satz 1 Wdh,Satz 2 kg,Satz 2 Wdh\n2026-10-05,squat,,,85,\n2026-10-06,squat,,,,\n,,,,,\n", BySet);

        Assert.Equal([(2, 85.0, null)], rows.Select(row => (SetRow)row.Content).Select(set => (set.Set!.Value, set.Kilograms!.Value, set.Repetitions)));
    }

    [Fact]
    public void ABadCellOfOneSetLeavesTheOthers()
    {
        var file = TableFiles.Decode("Tag,Übung,Satz 1 kg,Satz 1 Wdh,Satz 2 kg,Satz 2 Wdh\n2026-10-05,squat,80,acht,85,6\n", BySet);

        Assert.Equal("line 2, column 4 (Satz 1 Wdh): not a number with the decimal mark .", Assert.Single(file.Problems).ToString());
        Assert.Equal(2, ((SetRow)Assert.Single(file.Table!.Rows).Content).Set);
    }

    [Fact]
    public void ABadSharedCellIsNamedOnceAndTakesAllRowsOfTheLine()
    {
        var file = TableFiles.Decode(
            $"Tag,Übung,Satz 1 kg,Satz 2 kg\n2026-10-05,squat,80,85\n2026-10-06,{new string('x', 101)},80,85\n2026-10-07,squat,80,85\n", BySet);

        Assert.Equal("line 3, column 2 (Übung): longer than 100 characters", Assert.Single(file.Problems).ToString());
        Assert.Equal(4, file.Table!.Rows.Count);
    }

    [Fact]
    public void EveryPersonOfALineIsARow()
    {
        var rows = TableFiles.Rows("date,dauer,Anna,Ben\n2026-10-05,75,6,\n2026-10-06,60,,4\n", ByPerson);

        Assert.Equal(
            [("anna", 75.0, 6.0, "soccer"), ("ben", 60, 4, "soccer")],
            rows.Select(row => (row.Subject!, ((SessionRow)row.Content).Minutes!.Value, ((SessionRow)row.Content).Rating!.Value, ((SessionRow)row.Content).Sport!)));
        Assert.Equal(["2026-10-05|n=1", "2026-10-06|n=1"], rows.Select(row => row.Key));
    }

    [Fact]
    public void EveryTestOfALineIsARow()
    {
        var rows = TableFiles.Contents<TestRow>("Name;Tag;Kraft links;Kraft rechts;400 m;Ausgang\naada;2026-10-05;28,5;31;5:30;\nlumi;2026-10-05;;;;unable\n", ByTest);

        Assert.Equal(
            [
                ("grip_strength", 28.5, "kg", "left", null),
                ("grip_strength", 31, "kg", "right", null),
                ("walk_400_m", 330, "s", null, null),
                ("walk_400_m", null, null, null, TestOutcome.Unable),
            ],
            rows.Select(row => (row.Test, row.Value, row.Unit, row.Hand, row.Outcome)));
    }

    [Fact]
    public void ConstantsHoldInEveryRow()
    {
        var layout = new CsvLayout
        {
            Name = "band class",
            Kind = CsvKind.Sets,
            Header = ["date", "exercise"],
            DateColumn = "date",
            Fields = [TableFiles.Field("exercise", "exercise")],
            Constants = Pairs(("load", "body_weight"), ("repetitions", "12"), ("hold", "no")),
        };

        Assert.Equal(
            [(SetLoad.BodyWeight, 12)],
            TableFiles.Contents<SetRow>("date,exercise\n2026-10-05,squat\n", layout).Select(set => (set.Load, set.Repetitions!.Value)));
    }

    [Fact]
    public void AnAttendanceListNeedsNoFieldAtAll()
    {
        var layout = new CsvLayout
        {
            Name = "door",
            Kind = CsvKind.Days,
            Header = ["member", "visit"],
            PersonColumn = "member",
            DateColumn = "visit",
            Constants = Pairs(("day", "attended")),
        };

        var rows = TableFiles.Rows("member,visit\naada,2026-10-05\naada,2026-10-05\nlumi,2026-10-05\n", layout);

        Assert.Equal(["aada", "lumi"], rows.Select(row => row.Subject));
        Assert.All(rows, row => Assert.Equal(new DayRow(DayWord.Attended), row.Content));
    }

    private static Dictionary<string, string> Pairs(params (string Field, string Value)[] pairs) => pairs.ToDictionary(pair => pair.Field, pair => pair.Value);
}
