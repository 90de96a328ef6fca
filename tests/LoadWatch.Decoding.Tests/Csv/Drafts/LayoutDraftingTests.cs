using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Decoding.Csv.Drafts;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv.Drafts;

public class LayoutDraftingTests
{
    private const string Finnish = """
        aika;syke;nopeus (km/h);kierrosmäärä
        05.10.2026 09:00:00;120;24,5;85
        05.10.2026 09:00:01;121;24,9;86
        17.10.2026 09:00:02;122;25,3;87
        """;

    [Fact]
    public void ASpreadsheetIsDraftedButForItsZoneAndSport()
    {
        var draft = Draft(Finnish);

        var layout = draft.Layout!;
        Assert.Equal((';', ',', "auto"), (layout.Delimiter, layout.Decimal, layout.Encoding));
        Assert.Equal(new CsvTimeColumn { Column = "aika", Format = "dd.MM.yyyy HH:mm:ss", Zone = "?" }, layout.Time);
        Assert.Equal(
            [("syke", Channel.HeartRate, "bpm"), ("nopeus (km/h)", Channel.Speed, "km/h"), ("kierrosmäärä", Channel.Cadence, "rpm")],
            layout.Columns.Select(column => (column.Column, column.Channel, column.Unit)));
        Assert.Equal(["aika", "syke", "nopeus (km/h)", "kierrosmäärä"], layout.Header);
        Assert.Equal(["sport", "time.zone"], Keys(draft));
        Assert.Equal(["time.zone '?' is not an IANA zone"], layout.Validate());
        var recording = CsvFiles.Only(CsvFiles.Decode(Finnish, layout with { Time = layout.Time with { Zone = "Europe/Helsinki" } }));
        Assert.Equal([120.0, 121, 122], recording.Samples[Channel.HeartRate].ToArray());
        Assert.Equal(24.5 / 3.6, recording.Samples[Channel.Speed][0], 12);
    }

    [Fact]
    public void ATrackingExportDraftedAndFinishedIsReadAsByItsOwnLayout()
    {
        var bytes = new TrackingExport(5, 60).Text();
        var own = new CsvLayout
        {
            Name = "file",
            Header = ["player"],
            PersonColumn = "player",
            Time = new CsvTimeColumn { Column = "time", Format = "dd.MM.yyyy HH:mm:ss.f", Zone = "Europe/Helsinki" },
            Columns =
            [
                new() { Column = "heart rate", Channel = Channel.HeartRate, Unit = "bpm" },
                new() { Column = "speed", Channel = Channel.Speed, Unit = "m/s" },
                new() { Column = "distance", Channel = Channel.Distance, Unit = "m" },
            ],
        };

        var draft = Draft(bytes);

        Assert.Equal(["columns", "columns", "quality", "sport", "time.zone"], Keys(draft));
        Assert.Contains(draft.Doubts, doubt => doubt.StartsWith("columns: 'speed', 0 to 7.", StringComparison.Ordinal) && doubt.Contains("m/s or km/h?", StringComparison.Ordinal));
        Assert.Contains(draft.Found, found => found == "people: 'player' names 5, such as 'Pod 01', 'Pod 02', 'Pod 03'");
        var finished = draft.Layout! with
        {
            Time = draft.Layout.Time with { Format = "dd.MM.yyyy HH:mm:ss.f", Zone = "Europe/Helsinki" },
            Columns = [.. draft.Layout.Columns.Select(column => column with { Unit = column.Unit == "?" ? column.Channel == Channel.Speed ? "m/s" : "m" : column.Unit })],
        };
        Assert.Empty(finished.Validate());
        var (drafted, known) = (CsvFiles.Decode(bytes, finished).Recordings, CsvFiles.Decode(bytes, own).Recordings);
        Assert.Equal(5, drafted.Count);
        Assert.All(drafted.Zip(known), pair =>
        {
            Assert.Equal((pair.Second.Subject, pair.Second.Start), (pair.First.Subject, pair.First.Start));
            Assert.All(own.Columns, column => Assert.Equal(pair.Second.Samples[column.Channel].ToArray(), pair.First.Samples[column.Channel].ToArray()));
        });
    }

    [Fact]
    public void WhichOfTwoNumbersIsTheDayIsAskedUnlessARowTells()
    {
        const string open = "time,pulse\n03/04/2026 10:00:00,120\n03/04/2026 10:00:01,121\n";

        var asked = Draft(open);
        var told = Draft(open + "13/04/2026 10:00:00,122\n");

        Assert.Equal("?", asked.Layout!.Time.Format);
        Assert.Contains(asked.Doubts, doubt => doubt.StartsWith("time.format: ", StringComparison.Ordinal) && doubt.EndsWith("\"dd/MM/yyyy HH:mm:ss\" or \"MM/dd/yyyy HH:mm:ss\"?", StringComparison.Ordinal));
        Assert.NotEmpty(asked.Layout.Validate());
        Assert.Equal("dd/MM/yyyy HH:mm:ss", told.Layout!.Time.Format);
    }

    [Theory]
    [InlineData("2026-10-05T06:00:00Z", "iso8601", null)]
    [InlineData("2026-10-05 06:00:00", "iso8601", "?")]
    [InlineData("2026-10-05T06:00:00.5+02:00", "iso8601", null)]
    [InlineData("1791180000", "unix_s", null)]
    [InlineData("1791180000250", "unix_ms", null)]
    [InlineData("5.10.2026 6:00:00", "d.M.yyyy H:mm:ss", "?")]
    [InlineData("5.10.2026 6.00.00", "d.M.yyyy H.mm.ss", "?")]
    [InlineData("10/13/2026 6:00:00 PM", "MM/dd/yyyy h:mm:ss tt", "?")]
    [InlineData("13-10-2026 06:00", "dd-MM-yyyy HH:mm", "?")]
    [InlineData("2026/10/05 06:00:00", "yyyy/MM/dd HH:mm:ss", "?")]
    [InlineData("20261005 06:00:00", "yyyyMMdd HH:mm:ss", "?")]
    public void ANotationIsOneThatFitsAllRows(string cell, string format, string? zone)
    {
        var time = Draft($"timestamp;bpm\n{cell};120\n{cell};121\n").Layout!.Time;

        Assert.Equal(("timestamp", format, zone), (time.Column, time.Format, time.Zone));
    }

    [Fact]
    public void ADateBesideATimeOfDayIsAPair()
    {
        var time = Draft("Datum;Uhrzeit;Puls\n13.10.2026;06:00:00;120\n13.10.2026;06:00:01;121\n").Layout!.Time;

        Assert.Equal(new CsvTimeColumn { Column = "Uhrzeit", Format = "iso8601", DateColumn = "Datum", DateFormat = "dd.MM.yyyy", Zone = "?" }, time);
    }

    [Fact]
    public void SecondsBesideAStartThatStaysAreSecondsFromIt()
    {
        var draft = Draft("start,seconds,power (W)\n2026-10-05T06:00:00Z,0,100\n2026-10-05T06:00:00Z,1,110\n2026-10-05T06:00:00Z,2,120\n");

        Assert.Equal(new CsvTimeColumn { Column = "seconds", Format = "seconds_from_start", StartColumn = "start" }, draft.Layout!.Time);
        Assert.Empty(draft.Layout.Validate());
        Assert.Contains("time.format", Keys(draft));
    }

    [Fact]
    public void SecondsWithoutAStartAreAskedAbout()
    {
        var draft = Draft("elapsed,hr\n0,100\n1,110\n2,120\n");

        Assert.Equal("?", draft.Layout!.Time.StartColumn);
        Assert.Contains("time.start_column", Keys(draft));
    }

    [Theory]
    [InlineData("heart_rate_bpm", Channel.HeartRate, "bpm")]
    [InlineData("HeartRate", Channel.HeartRate, "bpm")]
    [InlineData("Herzfrequenz [1/min]", Channel.HeartRate, "bpm")]
    [InlineData("Fréquence cardiaque", Channel.HeartRate, "bpm")]
    [InlineData("Leistung (W)", Channel.Power, "W")]
    [InlineData("potenza watt", Channel.Power, "W")]
    [InlineData("speed_m_s", Channel.Speed, "m/s")]
    [InlineData("Geschwindigkeit km/h", Channel.Speed, "km/h")]
    [InlineData("hastighet", Channel.Speed, "?")]
    [InlineData("Trittfrequenz U/min", Channel.Cadence, "rpm")]
    [InlineData("Sträcka (km)", Channel.Distance, "km")]
    [InlineData("distance", Channel.Distance, "?")]
    [InlineData("Höhe", Channel.Altitude, "m")]
    [InlineData("korkeus m", Channel.Altitude, "m")]
    public void TradeWordsOfSeveralLanguagesNameTheChannels(string name, Channel channel, string unit)
    {
        var column = Assert.Single(Draft($"time;{name}\n2026-10-05T06:00:00Z;10,5\n2026-10-05T06:00:01Z;11,5\n").Layout!.Columns);

        Assert.Equal((name, channel, unit), (column.Column, column.Channel, column.Unit));
    }

    [Fact]
    public void ASpeedThatNothingReachesInMetresASecondIsInKilometresAnHour()
    {
        var draft = Draft("time,speed\n2026-10-05T06:00:00Z,12\n2026-10-05T06:00:01Z,52\n");

        Assert.Equal("km/h", Assert.Single(draft.Layout!.Columns).Unit);
    }

    [Fact]
    public void AUnitThatNothingReadsIsNamedAndLeftOut()
    {
        var draft = Draft("time,speed (mph),hr\n2026-10-05T06:00:00Z,12,100\n2026-10-05T06:00:01Z,13,101\n");

        Assert.Equal("hr", Assert.Single(draft.Layout!.Columns).Column);
        Assert.Contains(draft.Doubts, doubt => doubt.Contains("'speed (mph)', 12 to 13, seems to be speed in mph", StringComparison.Ordinal));
    }

    [Fact]
    public void ALineOfUnitsIsUsedAndNamed()
    {
        var draft = Draft("time,speed,hr\n,km/h,bpm\n2026-10-05T06:00:00Z,12,100\n2026-10-05T06:00:01Z,13,101\n");

        Assert.Equal(["bpm", "km/h"], draft.Layout!.Columns.Select(column => column.Unit));
        Assert.Contains(draft.Doubts, doubt => doubt.StartsWith("lines_below: line 2 holds units", StringComparison.Ordinal));
        Assert.Equal((0, 1), (draft.Layout.LinesAbove, draft.Layout.LinesBelow));
    }

    [Fact]
    public void ALineOfUnitsIsCountedFromTheEndOfNamesThatTakeTwoLines()
    {
        var draft = Draft("time,\"speed\nof the boat\",hr\n,km/h,bpm\n2026-10-05T06:00:00Z,12,100\n2026-10-05T06:00:01Z,13,101\n");

        Assert.Equal((0, 1), (draft.Layout!.LinesAbove, draft.Layout.LinesBelow));
    }

    [Fact]
    public void LinesAboveTheNamesAreNamed()
    {
        var draft = Draft("Export of Monday\n\ntime,hr,power\n2026-10-05T06:00:00Z,100,1\n2026-10-05T06:00:01Z,101,2\n");

        Assert.Equal(["time", "hr", "power"], draft.Layout!.Header);
        Assert.Contains(draft.Doubts, doubt => doubt.StartsWith("lines_above: the column names stand on line 3", StringComparison.Ordinal));
        Assert.Equal((2, 0), (draft.Layout.LinesAbove, draft.Layout.LinesBelow));
    }

    [Fact]
    public void OldEncodingsAndDecimalMarksThatMayBeThousandsAreAskedAbout()
    {
        var draft = Draft([.. Encoding.Latin1.GetBytes("Zeit;Höhe\n2026-10-05T06:00:00Z;1,234\n2026-10-05T06:00:01Z;1,235\n")]);

        Assert.Equal(("windows-1252", ',', "Höhe"), (draft.Layout!.Encoding, draft.Layout.Decimal, draft.Layout.Columns[0].Column));
        Assert.Contains("encoding", Keys(draft));
        Assert.Contains("decimal", Keys(draft));
    }

    [Fact]
    public void ATableOfSessionsIsDraftedByItsFields()
    {
        const string text = "Datum;Spieler;Dauer;Strecke km;Vmax km/h\n31.03.2026;aada;1:15:00;7,4;29,2\n31.03.2026;lumi;1:32:30;9,15;30,6\n01.04.2026;lumi;0:50:00;5,1;24,0\n";

        var draft = Draft(text);

        var layout = draft.Layout!;
        Assert.Equal((CsvKind.Sessions, "Datum", "dd.MM.yyyy", "Spieler"), (layout.Kind, layout.DateColumn, layout.DateFormat, layout.PersonColumn));
        Assert.Equal(
            [("Dauer", "minutes", "h:mm:ss", null), ("Strecke km", "quantity", "km", "distance"), ("Vmax km/h", "quantity", "km/h", "speed_top")],
            layout.Fields.Select(field => (field.Column, field.Field, field.Unit, field.Quantity)));
        Assert.Equal(["kind"], Keys(draft));
        Assert.Empty(layout.Validate());
        Assert.Equal(3, CsvFiles.Decode(text, layout).Table!.Rows.Count);
    }

    [Fact]
    public void ASetLogIsDraftedByItsFields()
    {
        var layout = Draft("Tag;Name;Übung;Wdh;kg\n31.03.2026;aada;Kniebeuge;5;80,5\n31.03.2026;aada;Kniebeuge;5;82,5\n").Layout!;

        Assert.Equal((CsvKind.Sets, "Tag", "Name"), (layout.Kind, layout.DateColumn, layout.PersonColumn));
        Assert.Equal(["exercise", "repetitions", "kilograms"], layout.Fields.Select(field => field.Field));
        Assert.Empty(layout.Validate());
    }

    [Fact]
    public void TheHardnessTheSecondsAndTheSpeedOfASetAreFound()
    {
        const string text = "Datum;Name;Übung;RPE;Sekunden;Hantelgeschwindigkeit m/s\n31.03.2026;aada;Unterarmstütz;7;40;\n31.03.2026;aada;Kniebeuge;8;;0,55\n";

        var layout = Draft(text).Layout!;

        Assert.Equal(CsvKind.Sets, layout.Kind);
        Assert.Equal(
            [("exercise", null), ("seconds", null), ("bar_speed", "m/s"), ("hardness", null)],
            layout.Fields.Select(field => (field.Field, field.Unit)));
        Assert.Empty(layout.Validate());
        Assert.Equal(2, CsvFiles.Decode(text, layout).Table!.Rows.Count);
    }

    [Fact]
    public void TheUnitOfABarSpeedThatStatesNoneIsAsked()
    {
        var draft = Draft("date;name;exercise;reps;bar speed\n2026-03-31;aada;squat;5;0.55\n2026-03-31;aada;squat;5;0.5\n");

        Assert.Equal("?", Assert.Single(draft.Layout!.Fields, field => field.Field == "bar_speed").Unit);
        Assert.NotEmpty(draft.Layout.Validate());
        Assert.Contains(draft.Doubts, doubt => doubt == "fields: 'bar speed', 0.5 to 0.55, is the speed of the bar in m/s or km/h?");
    }

    [Fact]
    public void HowHardASessionWasMakesItNoSet()
    {
        var layout = Draft("date;name;exercise;minutes;effort\n2026-03-31;aada;rowing;50;6\n2026-04-01;aada;rowing;40;5\n").Layout!;

        Assert.Equal((CsvKind.Sessions, "minutes,rating"), (layout.Kind, string.Join(',', layout.Fields.Select(field => field.Field))));
    }

    [Theory]
    [InlineData("Datum;Name;Geplant;Beginn;Ende\n31.03.2026;aada;match;17:30;19:00\n01.04.2026;aada;rest;;\n", CsvKind.Plan, "plan,start,end")]
    [InlineData("date;name;answer;rule;comment\n2026-03-31;aada;ill;;cold\n2026-04-01;aada;seen;;\n", CsvKind.Answers, "answer,rule,note")]
    public void APlanAndAnswersAreDraftedByTheirFields(string text, CsvKind kind, string fields)
    {
        var draft = Draft(text);

        var layout = draft.Layout!;
        Assert.Equal((kind, fields), (layout.Kind, string.Join(',', layout.Fields.Select(field => field.Field))));
        Assert.Contains(draft.Doubts, doubt => doubt.StartsWith("fields: add \"words\"", StringComparison.Ordinal));
        Assert.Empty(layout.Validate());
        Assert.Equal(2, CsvFiles.Decode(text, layout).Table!.Rows.Count);
    }

    [Fact]
    public void ABeginningAndAnEndWithoutWhatIsPlannedMakeNoPlan()
    {
        Assert.NotEqual(CsvKind.Plan, Draft("date;name;start;end\n2026-03-31;aada;17:30;19:00\n2026-04-01;aada;17:30;19:00\n").Layout!.Kind);
    }

    [Theory]
    [InlineData("time,hr,sport,mood,gear\n2026-10-05T06:00:00Z,100,running,1,a\n2026-10-05T06:00:01Z,101,running,1,b\n", "not used: 'mood', 'gear'")]
    [InlineData("Tag;Name;Übung;Wdh;Laune\n31.03.2026;aada;Kniebeuge;5;gut\n01.04.2026;aada;Kniebeuge;5;gut\n", "not used: 'Laune'")]
    public void EachColumnThatTheDraftPassesOverIsNamed(string text, string expected)
    {
        Assert.Equal(expected, Assert.Single(Draft(text).Found, found => found.StartsWith("not used", StringComparison.Ordinal)));
    }

    [Fact]
    public void WhereEveryColumnIsUsedNoneIsNamedAsNotUsed()
    {
        Assert.DoesNotContain(Draft(Finnish).Found, found => found.StartsWith("not used", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("", "the file is empty")]
    [InlineData("one column\n1\n2\n", "no mark parts the rows into columns")]
    [InlineData("1,2\n3,4\n5,6\n", "no line of column names")]
    [InlineData("time,hr\n", "no rows below the column names")]
    public void WhatGivesNoDraftSaysWhy(string text, string reason)
    {
        var draft = Draft(text);

        Assert.Null(draft.Layout);
        Assert.Contains(reason, draft.Problem!.Reason);
    }

    [Fact]
    public void TextsOfTheFileCannotBreakOutOfALine()
    {
        var draft = Draft("time,hr,\"na\nme\u2028\u202e\"\n2026-10-05T06:00:00Z,100,\"x\ny\"\n2026-10-05T06:00:01Z,101,\"x\ny\"\n");

        Assert.All(draft.Found.Concat(draft.Doubts), line => Assert.DoesNotContain(line, c => char.IsControl(c) || c is '\u2028' or '\u202e'));
    }

    private static LayoutDraft Draft(string text) => Draft(Encoding.UTF8.GetBytes(text));

    private static LayoutDraft Draft(byte[] bytes) => LayoutDrafting.Of(() => new MemoryStream(bytes, writable: false), "file");

    private static IEnumerable<string> Keys(LayoutDraft draft) => draft.Doubts.Select(doubt => doubt[..doubt.IndexOf(": ", StringComparison.Ordinal)]).Order(StringComparer.Ordinal);
}
