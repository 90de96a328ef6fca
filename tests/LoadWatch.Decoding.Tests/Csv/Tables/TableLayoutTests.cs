using System.Text.Json;
using System.Text.Json.Serialization;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using LoadWatch.Rows;

namespace LoadWatch.Decoding.Tests.Csv.Tables;

public class TableLayoutTests
{
    private static readonly JsonSerializerOptions Configuration = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        UnmappedMemberHandling = JsonUnmappedMemberHandling.Disallow,
        Converters = { new JsonStringEnumConverter(JsonNamingPolicy.SnakeCaseLower) },
    };

    private static CsvLayout Good { get; } = new()
    {
        Name = "good",
        Kind = CsvKind.Sets,
        Header = ["d", "x"],
        DateColumn = "d",
        Fields = [TableFiles.Field("x", "exercise")],
    };

    private static CsvLayout Tests { get; } = Good with { Kind = CsvKind.Tests, Fields = [TableFiles.Field("x", "value")] };

    private static CsvLayout Sessions { get; } = Good with { Kind = CsvKind.Sessions, Fields = [TableFiles.Field("x", "rating")] };

    private static CsvWideEntry Left { get; } = new() { Set = 1, Fields = [TableFiles.Field("kg 1", "kilograms")] };

    public static TheoryData<CsvLayout, string> Unusable() => new()
    {
        { Good with { DateColumn = null }, "date_column is missing: a table has it, or a time whose date counts" },
        { Good with { DateColumn = " " }, "date_column is blank" },
        { Good with { DateFormat = "dd.MM." }, "date_format 'dd.MM.' does not hold a full date" },
        { Good with { DateFormat = "QQ" }, "date_format 'QQ' is not a pattern: " },
        { Good with { Time = new() { Column = "t" } }, "date_column and time exclude each other" },
        { Good with { DateColumn = null, Time = new() { Column = "t", Format = "seconds_from_start", StartColumn = "s" } }, "time.format seconds_from_start holds no date" },
        { Good with { DateColumn = null, Time = new() { Column = "t", Zone = "Europe/Nowhere" } }, "time.zone 'Europe/Nowhere' is not an IANA zone" },
        { Good with { GroupColumn = "g" }, "group_column is of plan and answers only" },
        { Good with { Columns = [new() { Column = "p", Unit = "W" }] }, "columns is of samples only: a table has fields" },
        { Good with { Sport = "soccer" }, "sport is of samples only: a table has it among its constants" },
        { Good with { Quality = new() { Column = "q" } }, "quality is of samples only" },
        { Good with { Time = new() { DateColumn = "t" } }, "time.date_column is of samples only: a table has date_column" },
        { Good with { SportColumn = "s" }, "sport_column is of samples only: a table has it among its fields" },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field(" ", "set")] }, "fields: the column of set has no name" },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field("w", "weight")] }, "fields: 'weight' is no field of sets: use one of order, time, exercise, " },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field("w", "kilograms", "st")] }, "fields: column 'w': unit 'st' is not known for kilograms: use one of kg, lb" },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field("w", "set", "kg")] }, "fields: column 'w': set has no unit" },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field("w", "machine") with { Format = "x" }] }, "fields: column 'w': machine has no format" },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field("w", "time") with { Format = "HH" }] }, "fields: column 'w': format 'HH' does not hold a full time of day" },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field("w", "set") with { Quantity = "distance" }] }, "fields: column 'w': quantity is for the field quantity only, not for set" },
        { Good with { Fields = [.. Good.Fields, Worded("w", "load", ("Gummi", "rubber"))] }, "fields: column 'w': words: 'rubber' for 'Gummi': not one of weight, pin, body_weight, band" },
        { Good with { Fields = [.. Good.Fields, Worded("w", "load", (" ", "band"))] }, "fields: column 'w': words holds a blank one: an empty cell is unknown" },
        { Good with { Fields = [.. Good.Fields, Worded("w", "load", ("kg", "weight"), ("KG", "band"))] }, "fields: column 'w': words holds 'kg' twice" },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field("y", "exercise")] }, "exercise is stated twice" },
        { Good with { Fields = [.. Good.Fields, TableFiles.Field("x", "machine")] }, "column 'x' is used for two things" },
        { Good with { PersonColumn = "x" }, "column 'x' is used for two things" },
        { Good with { Fields = [TableFiles.Field("x", "machine")] }, "nothing states exercise: it needs a field or a constant" },
        { Good with { Constants = Pairs(("exercise", "squat")) }, "exercise is stated twice" },
        { Good with { Constants = Pairs(("set", "0")) }, "constant set '0': outside 1 to 200" },
        { Good with { Constants = Pairs(("machine", " ")) }, "constant machine is blank" },
        { Good with { Constants = Pairs(("gym", "north")) }, "constant 'gym' is no field that can be constant" },
        { Sessions with { Constants = Pairs(("quantity", "5")) }, "constant 'quantity' is no field that can be constant" },
        { Sessions with { Fields = [] }, "fields names no column" },
        { Sessions with { Fields = [TableFiles.Quantity("x", "distance", "mi")] }, "fields: column 'x': unit 'mi' is not known for distance: use one of m, km" },
        { Sessions with { Fields = [TableFiles.Quantity("x", "distance", null)] }, "fields: column 'x': unit is missing: distance is measured in m, km" },
        { Sessions with { Fields = [TableFiles.Field("x", "quantity")] }, "fields: column 'x': quantity is missing: it names the number" },
        { Sessions with { Fields = [TableFiles.Quantity("x", "Total Distance", "m")] }, "fields: column 'x': quantity 'Total Distance' must be small letters" },
        { Sessions with { Fields = [TableFiles.Quantity("x", "minutes", "min")] }, "fields: column 'x': quantity 'minutes' is a field of its own" },
        { Sessions with { Fields = [TableFiles.Quantity("x", "climb", "m"), TableFiles.Quantity("y", "climb", "m")] }, "quantity climb is stated twice" },
        { Tests, "nothing states test: it needs a field or a constant" },
        { Tests with { Constants = Pairs(("test", "gait_speed")), Fields = [TableFiles.Field("x", "value", "mph")] }, "fields: column 'x': unit 'mph' is a unit of no test" },
        { Tests with { Constants = Pairs(("test", "gait_speed"), ("unit", "m/s")), Fields = [TableFiles.Field("x", "value", "m/s")] }, "unit is stated twice" },
        { Tests with { Constants = Pairs(("test", "gait_speed")), Fields = [TableFiles.Field("x", "value"), TableFiles.Field("c", "chair_height")] }, "fields: column 'c': unit is missing: chair_height is written in one of m, cm" },
        { Good with { Wide = [Left, new() { Set = 2 }] }, "wide[1].fields names no column" },
        { Good with { Wide = [Left with { Constants = Pairs(("set", "1")) }] }, "wide[0]: set is stated twice" },
        { Good with { Wide = [Left with { Set = 0 }] }, "wide[0]: constant set '0': outside 1 to 200" },
        { Good with { Wide = [Left with { Test = "gait_speed" }] }, "wide[0]: constant 'test' is no field that can be constant" },
        { Good with { Wide = [Left with { Person = "anna" }, Left with { Fields = [TableFiles.Field("kg 2", "kilograms")] }] }, "wide: either every entry names a person or none" },
        { Good with { PersonColumn = "p", Wide = [Left with { Person = "anna" }] }, "wide: a person there and person_column or group_column exclude each other" },
        { Good with { Wide = [Left with { Person = " " }] }, "wide: a person is blank" },
    };

    [Theory]
    [MemberData(nameof(Unusable))]
    public void WhatMakesALayoutUnusableIsSaid(CsvLayout layout, string expected)
    {
        Assert.StartsWith(expected, Assert.Single(layout.Validate()));
        Assert.Contains(expected, TableFiles.Refusal(TableFiles.Decode("d,x\n", layout)));
    }

    [Fact]
    public void KeysOfTablesMeanNothingForSamples()
    {
        var layout = BuiltInLayouts.Samples with
        {
            GroupColumn = "g", DateColumn = "d", Fields = Good.Fields, Constants = Pairs(("set", "1")), Wide = [Left], Table = TableNaming.Folder, Covers = TableCover.Dates,
        };

        Assert.Equal(
            ["group_column", "date_column", "fields", "constants", "wide", "table", "covers"],
            layout.Validate().Select(reason => reason.Replace(" is of tables only, not of samples", "", StringComparison.Ordinal)));
    }

    [Fact]
    public void UsableLayoutsHaveNoReasons() =>
        Assert.All([Good, Sessions, TableFiles.German, Good with { Wide = [Left] }, .. BuiltInLayouts.All], layout => Assert.Empty(layout.Validate()));

    [Fact]
    public void ALayoutIsWrittenInTheConfigurationWithTheseKeys()
    {
        const string Json = """
            { "name": "gym", "kind": "sets", "header": ["Tag", "Übung"], "delimiter": ";", "decimal": ",", "encoding": "utf-8",
              "person_column": "Nr", "date_column": "Tag", "date_format": "dd.MM.yyyy", "table": "folder", "covers": "everything",
              "fields": [{ "column": "Übung", "field": "exercise", "words": { "Beinpresse": "leg_press" } }],
              "constants": { "load": "weight" },
              "wide": [{ "set": 1, "machine": "B2", "constants": { "fast": "yes" }, "fields": [{ "column": "lb 1", "field": "kilograms", "unit": "lb" }] }] }
            """;
        var layout = JsonSerializer.Deserialize<CsvLayout>(Json, Configuration)!;

        Assert.Empty(layout.Validate());
        var table = TableFiles.Decode("Tag;Nr;Übung;lb 1\n05.10.2026;aada;Beinpresse;100\n", layout).Table!;
        Assert.Equal((RowKind.Sets, "gym", true, true), (table.Kind, table.Layout, table.IsNamedByFolder, table.CoversEverything));
        Assert.Equal(
            new SetRow(null, null, "leg_press", "B2", 1, null, 45.359237, null, null, null, null, SetLoad.Weight, IsHold: false, IsFast: true),
            Assert.Single(table.Rows).Content);
    }

    [Fact]
    public void NoFileFitsTwoOfOurOwnFormats()
    {
        foreach (var layout in BuiltInLayouts.All)
        {
            var names = layout.Header
                .Concat(layout.Fields.Select(field => field.Column))
                .Concat(layout.Columns.Select(column => column.Column))
                .Concat([layout.SportColumn, layout.PersonColumn, layout.GroupColumn])
                .OfType<string>().Distinct().ToList();
            var others = BuiltInLayouts.All.Where(other => other != layout).ToArray();

            Assert.StartsWith("line 1: no layout fits", TableFiles.Refusal(TableFiles.Decode(string.Join(',', names) + "\n", others)), StringComparison.Ordinal);
            Assert.Equal(layout.Name, TableFiles.Decode(string.Join(',', names) + "\n").SourceName);
        }
    }

    [Fact]
    public void AFileNeedsAColumnThatSaysSomething() => Assert.StartsWith(
        "line 1: no layout fits", TableFiles.Refusal(TableFiles.Decode("d\n2026-10-05\n", Sessions with { Header = ["d"] })), StringComparison.Ordinal);

    private static CsvField Worded(string column, string field, params (string Theirs, string Ours)[] words) =>
        TableFiles.Field(column, field) with { Words = Pairs(words) };

    private static Dictionary<string, string> Pairs(params (string Field, string Value)[] pairs) => pairs.ToDictionary(pair => pair.Field, pair => pair.Value);
}
