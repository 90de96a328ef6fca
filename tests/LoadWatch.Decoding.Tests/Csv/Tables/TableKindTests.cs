using LoadWatch.Decoding.Csv;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Tests.Csv.Tables;

/// <summary>What the fields of each kind become: units, words, limits.</summary>
public class TableKindTests
{
    private static readonly LocalDate Date = new(2026, 10, 5);

    [Fact]
    public void ASessionHasItsFieldsAndItsQuantitiesSortedByName()
    {
        var layout = Layout(
            CsvKind.Sessions,
            TableFiles.Field("nr", "order"), TableFiles.Field("um", "start"), TableFiles.Field("sport", "sport"), TableFiles.Field("drill", "drill"),
            TableFiles.Field("dauer", "minutes", "h:mm:ss"), TableFiles.Field("rpe", "rating"), TableFiles.Field("was", "content"),
            TableFiles.Quantity("v", "speed_top", "km/h"), TableFiles.Quantity("km", "distance", "km"),
            TableFiles.Quantity("schnell", "distance_above_5_5_m_s", "m"), TableFiles.Quantity("impacts", "impacts", "count"));

        var row = TableFiles.Contents<SessionRow>(
            "d,nr,um,sport,drill,dauer,rpe,was,v,km,schnell,impacts\n2026-10-05,2,17:30,soccer,Small games,1:05:30,6.5,Match,27,8.25,410,\n", layout)[0];

        // 1 h 5 min 30 s = 65.5 min; 27 km/h = 7.5 m/s.
        Assert.Equal((2, new LocalTime(17, 30), "soccer", "Small games"), (row.Order, row.Start, row.Sport, row.Drill));
        Assert.Equal((65.5, 6.5, DeclaredContent.Match), (row.Minutes, row.Rating, row.Content));
        Assert.Equal(
            [
                new Quantity("distance", 8250, "m", Estimated: false),
                new Quantity("distance_above_5_5_m_s", 410, "m", Estimated: false),
                new Quantity("speed_top", 7.5, "m/s", Estimated: false),
            ],
            row.Quantities);
    }

    [Fact]
    public void EmptyCellsAreUnknown()
    {
        var row = TableFiles.Contents<SessionRow>("date,minutes,rating,distance_m\n2026-10-05,,3,\n")[0];

        Assert.Equal((null, 3.0, 0), (row.Minutes, row.Rating, row.Quantities.Count));
    }

    [Fact]
    public void ASetHasItsFields()
    {
        var layout = Layout(
            CsvKind.Sets,
            TableFiles.Field("x", "exercise"), TableFiles.Field("zeit", "time"), TableFiles.Field("gerät", "machine"), TableFiles.Field("lb", "kilograms", "lb"),
            TableFiles.Field("pin", "pin"), TableFiles.Field("rir", "repetitions_in_reserve"), TableFiles.Field("schwer", "hardness"),
            TableFiles.Field("dauer", "seconds", "m:ss"), TableFiles.Field("art", "load") with { Words = Words(("Gummi", "band"), ("Stecker", "pin")) },
            TableFiles.Field("gehalten", "hold") with { Words = Words(("ja", "yes"), ("nein", "no")) }, TableFiles.Field("schnell", "fast"),
            TableFiles.Field("tempo", "bar_speed", "m/s"));

        var row = TableFiles.Contents<SetRow>(
            "d,x,zeit,gerät,lb,pin,rir,schwer,dauer,art,gehalten,schnell,tempo\n2026-10-05,plank,17:05:09,B2,100,4,1.5,8,1:30,GUMMI,Ja,no,0.85\n", layout)[0];

        // 100 lb = 45.359237 kg by definition of the pound.
        Assert.Equal(
            new SetRow(null, new LocalTime(17, 5, 9), "plank", "B2", null, null, 45.359237, 4, 1.5, 8, 90, SetLoad.Band, IsHold: true, IsFast: false) { BarSpeedMetresPerSecond = 0.85 },
            row);
    }

    [Theory]
    [InlineData("80", "", SetLoad.Weight)]
    [InlineData("80", "3", SetLoad.Weight)]
    [InlineData("0", "", SetLoad.BodyWeight)]
    [InlineData("", "3", SetLoad.Pin)]
    [InlineData("", "", SetLoad.Weight)]
    public void WithoutAWordTheLoadFollowsFromTheCells(string kilograms, string pin, SetLoad expected) => Assert.Equal(
        expected, TableFiles.Contents<SetRow>($"date,exercise,repetitions,kilograms,pin\n2026-10-05,squat,8,{kilograms},{pin}\n")[0].Load);

    [Theory]
    [InlineData("grip_strength,31.5,kg", 31.5, "kg")]
    [InlineData("grip_strength,50,lb", 22.6796185, "kg")]
    [InlineData("chair_stands_5,13.4,s", 13.4, "s")]
    [InlineData("gait_speed,3.6,km/h", 1, "m/s")]
    [InlineData("walk_400_m,6,min", 360, "s")]
    [InlineData("height,172,cm", 1.72, "m")]
    [InlineData("heart_rate_max,188,bpm", 188, "bpm")]
    [InlineData("short_physical_performance_battery,9,points", 9, "points")]
    public void ATestIsKeptInItsOwnUnit(string cells, double value, string unit)
    {
        var row = TableFiles.Contents<TestRow>($"date,test,value,unit\n2026-10-05,{cells}\n")[0];

        Assert.Equal((value, unit), (row.Value, row.Unit));
    }

    [Fact]
    public void ATestHasItsFields()
    {
        var rows = TableFiles.Contents<TestRow>("""
            date,test,value,unit,exercise,machine,outcome,hand,device,chair_height_m
            2026-10-05,one_repetition_max,120,kg,leg_press,B2,,,,
            2026-10-05,grip_strength,31.5,kg,,,,left,dynamometer 2,
            2026-10-05,chair_stands_5,,,,,unable,,,0.43

            """.ReplaceLineEndings("\n"));

        Assert.Equal(
            [
                new TestRow("one_repetition_max", 120, "kg", "leg_press", "B2", null, null, null, null),
                new TestRow("grip_strength", 31.5, "kg", null, null, null, "left", "dynamometer 2", null),
                new TestRow("chair_stands_5", null, null, null, null, TestOutcome.Unable, null, null, 0.43),
            ],
            rows);
    }

    [Theory]
    [InlineData("grip_strength,31.5,", "column 4 (unit): no unit: grip_strength is measured in kg, lb")]
    [InlineData("grip_strength,31.5,N", "column 4 (unit): not a unit of grip_strength: use one of kg, lb")]
    [InlineData("grip_strength,151,kg", "column 3 (value): outside 0 to 150 kg")]
    [InlineData("walk_400_m,6:00,min", "column 3 (value): not a number with the decimal mark .")]
    [InlineData("grip_strength,,kg", "column 3 (value): neither a value nor an outcome")]
    [InlineData("one_repetition_max,100,kg", "line 2 (exercise): no exercise: one_repetition_max needs one")]
    [InlineData(",31.5,kg", "column 2 (test): no test")]
    public void AnIncompleteTestIsNamed(string cells, string expected)
    {
        var refused = TableFiles.Decode($"date,test,value,unit\n2026-10-05,{cells}\n");

        Assert.Equal("none of 1 rows can be used", TableFiles.Refusal(refused));
        Assert.Equal(expected.StartsWith("line", StringComparison.Ordinal) ? expected : $"line 2, {expected}", refused.Problems[1].ToString());
    }

    [Fact]
    public void AnUnknownTestIsNamedWithTheKnownOnes()
    {
        var problem = TableFiles.Decode("date,test,value\n2026-10-05,grip,31\n").Problems[1];

        Assert.StartsWith("not one of grip_strength, chair_stands_5, ", problem.Reason, StringComparison.Ordinal);
        Assert.Contains(", one_repetition_max, ", problem.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void EveryFunctionTestThatARuleKnowsIsReadInItsUnit()
    {
        foreach (var test in FunctionTests.All)
        {
            var value = test.Word == FunctionTests.Walk400 ? 300 : 4; // Plausible for the test.

            var row = TableFiles.Contents<TestRow>($"date,test,value,unit\n2026-10-05,{test.Word},{value},{test.Unit}\n")[0];

            Assert.Equal((test.Word, value, test.Unit), (row.Test, row.Value!.Value, row.Unit));
        }
    }

    [Fact]
    public void EveryWordOfADayIsRead()
    {
        var words = TableFiles.Contents<DayRow>("""
            date,day
            2026-10-01,rest
            2026-10-02,ill
            2026-10-03,injured
            2026-10-04,away
            2026-10-05,attended
            2026-10-06,absent

            """.ReplaceLineEndings("\n")).Select(row => row.Word);

        Assert.Equal(Enum.GetValues<DayWord>(), words);
    }

    [Fact]
    public void AnUnknownWordIsNamedWithTheKnownOnes() => Assert.Equal(
        "line 2, column 2 (day): not one of rest, ill, injured, away, attended, absent",
        TableFiles.Decode("date,day\n2026-10-05,krank\n").Problems[1].ToString());

    [Fact]
    public void APlanIsAboutAGroupAPersonOrEverybody()
    {
        var rows = TableFiles.Rows("""
            group,person,from,until,plan,start,end,recording,sport
            u19,,2026-10-05,,team_session,17:30,19:00,yes,soccer
            ,aada,2026-10-05,2026-10-11,light_week,,,,
            ,,2026-12-21,2027-01-03,off_season,,,,

            """.ReplaceLineEndings("\n"));

        Assert.Equal(["u19", "aada", null], rows.Select(row => row.Subject));
        Assert.Equal(
            [
                new PlanRow(PlanWord.TeamSession, null, new LocalTime(17, 30), new LocalTime(19, 0), RecordingExpected: true, "soccer"),
                new PlanRow(PlanWord.LightWeek, new LocalDate(2026, 10, 11), null, null, RecordingExpected: false, null),
                new PlanRow(PlanWord.OffSeason, new LocalDate(2027, 1, 3), null, null, RecordingExpected: false, null),
            ],
            rows.Select(row => (PlanRow)row.Content));
    }

    [Fact]
    public void AnAnswerHasItsFields()
    {
        var rows = TableFiles.Rows(
            "date,person,group,answer,until,rule,file,by,note\n"
            + "2026-10-05,aada,,shelve,2026-10-12,load_ratio,,Kerttu,\"as agreed,\nsee plan\"\n2026-10-05,aada,,belongs_to,,,a1b2c3,,\n2026-10-06,,u19,rest,,,,,\n");

        Assert.Equal(["aada", "aada", "u19"], rows.Select(row => row.Subject));
        Assert.Equal(
            [
                new AnswerRow(AnswerWord.Shelve, new LocalDate(2026, 10, 12), "load_ratio", null, "Kerttu", "as agreed,\nsee plan"),
                new AnswerRow(AnswerWord.BelongsTo, null, null, "a1b2c3", null, null),
                new AnswerRow(AnswerWord.Rest, null, null, null, null, null),
            ],
            rows.Select(row => (AnswerRow)row.Content));
        Assert.Equal([2, 4, 5], rows.Select(row => row.Line));
    }

    [Theory]
    [InlineData("2026-10-05,aada,u19,seen,,", "line 2, column 3 (group): a person and a group in one row")]
    [InlineData("2026-10-05,,,seen,,", "line 2, column 2 (person): neither a person nor a group")]
    [InlineData("2026-10-05,aada,,belongs_to,,", "line 2, column 6 (file): no file: belongs_to needs one")]
    [InlineData("2026-10-05,aada,,ill,2026-10-04,", "line 2, column 5 (until): before the date on which it begins")]
    [InlineData("2026-10-05,aada,,ill,12.10.2026,", "line 2, column 5 (until): not a date such as 2026-03-31")]
    public void AnAnswerThatCannotBeIsNamed(string row, string expected) => Assert.Equal(
        expected, TableFiles.Decode($"date,person,group,answer,until,file\n{row}\n").Problems[1].ToString());

    [Theory]
    [InlineData("minutes", "min", "0", "not above 0 and up to 1440 min")]
    [InlineData("minutes", "h", "24.1", "not above 0 and up to 1440 min")]
    [InlineData("minutes", "h:mm:ss", "1:60:00", "not a length of time as h:mm:ss")]
    [InlineData("minutes", "h:mm:ss", "65:30", "not a length of time as h:mm:ss")]
    [InlineData("minutes", "h:mm", "1:5", "not a length of time as h:mm")]
    [InlineData("minutes", "m:ss", "-5:00", "not a length of time as m:ss")]
    [InlineData("rating", null, "11", "outside 0 to 10")]
    [InlineData("rating", null, "-1", "outside 0 to 10")]
    [InlineData("order", null, "0", "outside 1 to 20")]
    [InlineData("start", null, "25:00", "not a time of day such as 17:30")]
    [InlineData("start", null, "5 pm", "not a time of day such as 17:30")]
    [InlineData("sport", null, "Fußball", "not a word for a sport: small letters, digits and _, with / before a detail")]
    public void AValueOutOfItsLimitsIsNamed(string field, string? unit, string cell, string expected) => Assert.Equal(
        $"line 2, column 2 (c): {expected}",
        TableFiles.Decode($"d,c\n2026-10-05,{cell}\n", Layout(CsvKind.Sessions, TableFiles.Field("c", field, unit))).Problems[1].ToString());

    [Theory]
    [InlineData("hardness", "10.5", "outside 0 to 10")]
    [InlineData("repetitions_in_reserve", "51", "outside 0 to 50")]
    [InlineData("seconds", "86401", "outside 0 to 86400 s")]
    [InlineData("fast", "x", "not one of yes, no")]
    public void AValueOfASetOutOfItsLimitsIsNamed(string field, string cell, string expected) => Assert.Equal(
        $"line 2, column 3 (c): {expected}",
        TableFiles.Decode(
            $"d,x,c\n2026-10-05,squat,{cell}\n", Layout(CsvKind.Sets, TableFiles.Field("x", "exercise"), TableFiles.Field("c", field))).Problems[1].ToString());

    [Theory]
    [InlineData("s", "3930", 65.5)]
    [InlineData("h", "1.5", 90)]
    [InlineData("h:mm", "1:05", 65)]
    [InlineData("m:ss", "75:30", 75.5)]
    public void MinutesComeFromTheirUnit(string unit, string cell, double expected) => Assert.Equal(
        expected,
        TableFiles.Contents<SessionRow>($"d,c\n2026-10-05,{cell}\n", Layout(CsvKind.Sessions, TableFiles.Field("c", "minutes", unit)))[0].Minutes);

    [Fact]
    public void AWordMayStandForAnyValueOrForNone()
    {
        var layout = Layout(
            CsvKind.Sets,
            TableFiles.Field("x", "exercise") with { Words = Words(("Beinpresse", "leg_press")) },
            TableFiles.Field("kg", "kilograms") with { Words = Words(("Körpergewicht", "0"), ("-", "")) }) with { Decimal = ',', Delimiter = ';' };

        var rows = TableFiles.Contents<SetRow>("d;x;kg\n2026-10-05;Beinpresse;körpergewicht\n2026-10-05;Beinpresse;-\n2026-10-05;;-\n", layout);

        Assert.Equal([("leg_press", 0.0), ("leg_press", null)], rows.Select(row => (row.Exercise, row.Kilograms)));
    }

    [Fact]
    public void ATimeOfDayIsReadByItsPattern()
    {
        var layout = Layout(CsvKind.Sessions, TableFiles.Field("um", "start") with { Format = "h:mm tt" });

        Assert.Equal(new LocalTime(17, 30), TableFiles.Contents<SessionRow>("d,um\n2026-10-05,5:30 PM\n", layout)[0].Start);
    }

    [Fact]
    public void TheDateMayComeFromAMomentAndTheTimeWhereAFieldSaysSo()
    {
        var layout = Layout(CsvKind.Sets, TableFiles.Field("x", "exercise"), TableFiles.Field("t", "time")) with
        {
            DateColumn = null,
            Header = ["t"],
            Time = new CsvTimeColumn { Column = "t", Zone = "Europe/Helsinki" },
        };

        const string Text = "t,x\n2026-10-05T23:30:00Z,squat\n2026-10-05T23:30:00+02:00,squat\n2026-10-05T23:30:00,squat\n";
        var rows = TableFiles.Rows(Text, layout);

        // 23:30 UTC is 02:30 of the next day in Helsinki (summer time, +03); a written offset and a local time stay as they are.
        Assert.Equal([Date.PlusDays(1), Date, Date], rows.Select(row => row.Date));
        Assert.Equal([new LocalTime(2, 30), new(23, 30), new(23, 30)], rows.Select(row => ((SetRow)row.Content).Time));
        Assert.All(TableFiles.Contents<SetRow>(Text, layout with { Fields = [layout.Fields[0]] }), set => Assert.Null(set.Time));
    }

    [Theory]
    [InlineData(CsvKind.Sessions, false)]
    [InlineData(CsvKind.Sets, false)]
    [InlineData(CsvKind.Days, false)]
    [InlineData(CsvKind.Tests, true)]
    [InlineData(CsvKind.Plan, true)]
    [InlineData(CsvKind.Answers, true)]
    public void WhatAVersionSpeaksForFollowsFromTheKindUnlessTheLayoutSaysIt(CsvKind kind, bool everything)
    {
        var layout = BuiltInTables.All.Single(layout => layout.Kind == kind);
        var names = string.Join(',', layout.Header) + "\n";

        bool Covers(TableCover? covers) => TableFiles.Decode(names, layout with { Covers = covers }).Table!.CoversEverything;
        bool IsNamedByFolder(TableNaming naming) => TableFiles.Decode(names, layout with { Table = naming }).Table!.IsNamedByFolder;
        Assert.Equal((everything, true, false), (Covers(null), Covers(TableCover.Everything), Covers(TableCover.Dates)));
        Assert.Equal((false, true), (IsNamedByFolder(TableNaming.File), IsNamedByFolder(TableNaming.Folder)));
    }

    private static CsvLayout Layout(CsvKind kind, params CsvField[] fields) =>
        new() { Name = "own", Kind = kind, Header = ["d"], DateColumn = "d", Fields = fields };

    private static Dictionary<string, string> Words(params (string Theirs, string Ours)[] words) =>
        words.ToDictionary(pair => pair.Theirs, pair => pair.Ours);
}
