using System.Text.Json;
using System.Text.Json.Serialization;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvLayoutTests
{
    private static readonly CsvChannelColumn Power = new() { Column = "power_w", Channel = Channel.Power, Unit = "W" };

    private static readonly JsonSerializerOptions Configuration = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        UnmappedMemberHandling = JsonUnmappedMemberHandling.Disallow,
        Converters = { new JsonStringEnumConverter(JsonNamingPolicy.SnakeCaseLower) },
    };

    public static TheoryData<CsvLayout, string> Unusable() => new()
    {
        { Good with { Name = " " }, "name is missing" },
        { Good with { Header = [] }, "header names no column, so nothing could pick the layout" },
        { Good with { Header = ["time", ""] }, "header holds an empty name" },
        { Good with { Header = ["time", "time"] }, "header names 'time' twice" },
        { Good with { Delimiter = '"' }, "delimiter must be one of" },
        { Good with { Delimiter = 'ä' }, "delimiter must be one of" },
        { Good with { Delimiter = '\n' }, "delimiter must be one of" },
        { Good with { Decimal = '\'' }, "decimal must be . or ," },
        { Good with { Encoding = "latin-9" }, "encoding 'latin-9' is not known" },
        { Good with { Time = new CsvTimeColumn() }, "time.column is missing" },
        { Good with { Time = Good.Time with { Zone = "Europe/Nowhere" } }, "time.zone 'Europe/Nowhere' is not an IANA zone" },
        { Good with { Time = Good.Time with { Format = "seconds_from_start" } }, "time.start_column is missing" },
        { Good with { Time = Good.Time with { StartColumn = "begin" } }, "time.start_column is used by seconds_from_start only" },
        { Good with { Time = Good.Time with { Format = "HH:mm:ss" } }, "time.format 'HH:mm:ss' does not hold a full date and time" },
        { Good with { Time = Good.Time with { Format = "dd.MM.yyyy hh:mm" } }, "time.format 'dd.MM.yyyy hh:mm' does not hold a full date and time" },
        { Good with { Time = Good.Time with { Format = "" } }, "time.format '' is not a pattern" },
        { Good with { Time = Good.Time with { Format = "QQ" } }, "time.format 'QQ' " },
        { Good with { Time = DayTime with { Format = "HH:mm:ss dd.MM.yyyy" } }, "time.format 'HH:mm:ss dd.MM.yyyy' is not a pattern of a time of day" },
        { Good with { Time = DayTime with { Format = "hh:mm:ss" } }, "time.format 'hh:mm:ss' does not hold a time of day" },
        { Good with { Time = DayTime with { Format = "seconds_from_start" } }, "time.format 'seconds_from_start' " },
        { Good with { Time = DayTime with { DateFormat = "dd.MM." } }, "time.date_format 'dd.MM.' does not hold a full date" },
        { Good with { Time = DayTime with { StartColumn = "begin" } }, "time.start_column and time.date_column exclude each other" },
        { Good with { PersonColumn = "time" }, "column 'time' is used for two things" },
        { Good with { Quality = new() { AtLeast = 1 } }, "quality.column is missing" },
        { Good with { Quality = new() { Column = "fix" } }, "quality needs at_least or at_most" },
        { Good with { Quality = new() { Column = "fix", AtLeast = 2, AtMost = 1 } }, "quality.at_least is above quality.at_most" },
        { Good with { Quality = new() { Column = "fix", AtLeast = 2, Channels = [] } }, "quality.channels names no channel" },
        { Good with { Quality = new() { Column = "power_w", AtLeast = 2 } }, "column 'power_w' is used for two things" },
        { Good with { Columns = [] }, "columns names no channel" },
        { Good with { Columns = [Power with { Column = "" }] }, "columns: the column of Power has no name" },
        { Good with { Columns = [Power with { Unit = "bpm" }] }, "columns: unit 'bpm' of 'power_w' is not known for Power" },
        { Good with { Columns = [Power, Power with { Column = "other" }] }, "columns: two columns for Power" },
        { Good with { Columns = [Power, new() { Column = "time", Channel = Channel.Speed, Unit = "km/h" }] }, "column 'time' is used for two things" },
        { Good with { Sport = "cycling", SportColumn = "sport" }, "sport and sport_column exclude each other" },
        { Good with { Sport = "Rad fahren" }, "sport 'Rad fahren' must be a word" },
    };

    private static CsvLayout Good { get; } = new()
    {
        Name = "good",
        Header = ["time"],
        Time = new CsvTimeColumn { Column = "time" },
        Columns = [Power],
    };

    private static CsvTimeColumn DayTime { get; } = new() { Column = "time", DateColumn = "day" };

    [Theory]
    [MemberData(nameof(Unusable))]
    public void WhatMakesALayoutUnusableIsSaid(CsvLayout layout, string expected)
    {
        Assert.StartsWith(expected, Assert.Single(layout.Validate()));
        Assert.Contains(expected, CsvFiles.Refusal(CsvFiles.Decode("time,power_w\n", layout)));
    }

    [Fact]
    public void UsableLayoutsHaveNoReasons()
    {
        Assert.Empty(Good.Validate());
        Assert.Empty(BuiltInLayouts.Samples.Validate());
        Assert.Empty(CsvFiles.Finnish.Validate());
    }

    [Fact]
    public void ALayoutIsWrittenInTheConfigurationWithTheseKeys()
    {
        const string Json = """
            { "name": "bench", "kind": "samples", "header": ["t", "begin"], "delimiter": ";", "decimal": ",", "encoding": "utf-8",
              "time": { "column": "t", "format": "seconds_from_start", "zone": "Europe/Helsinki", "start_column": "begin", "start_format": "unix_s" },
              "columns": [{ "column": "v", "channel": "heart_rate", "unit": "bpm" }, { "column": "d", "channel": "distance", "unit": "km" }],
              "sport_column": "what" }
            """;
        var layout = JsonSerializer.Deserialize<CsvLayout>(Json, Configuration)!;

        Assert.Empty(layout.Validate());
        var recording = CsvFiles.Only(CsvFiles.Decode("t;begin;v;d;what\n0,5;1791180000;142;1,5;rowing\n", layout));
        Assert.Equal(1791180000500, recording.Samples.UnixMilliseconds[0]);
        Assert.Equal((142, 1500), (recording.Samples[Channel.HeartRate][0], recording.Samples[Channel.Distance][0]));
        Assert.Equal("rowing", recording.Sport.Name);
    }

    [Fact]
    public void TheKeysOfASquadAreWrittenLikeThis()
    {
        const string Json = """
            { "name": "pods", "header": ["pod"], "person_column": "pod",
              "time": { "column": "clock", "format": "HH:mm:ss.f", "date_column": "day", "date_format": "dd.MM.yyyy" },
              "columns": [{ "column": "v", "channel": "speed", "unit": "m/s" }],
              "quality": { "column": "fix", "at_least": 0.5, "at_most": 1, "channels": ["speed"] } }
            """;
        var layout = JsonSerializer.Deserialize<CsvLayout>(Json, Configuration)!;

        Assert.Empty(layout.Validate());
        var recording = CsvFiles.Only(CsvFiles.Decode("pod,day,clock,v,fix\n7,05.10.2026,06:00:00.5,3,1\n7,,06:00:00.6,4,0.4\n", layout));
        Assert.Equal(("7", 1791180000500), (recording.Subject, recording.Samples.UnixMilliseconds[0]));
        Assert.Equal([3, double.NaN], recording.Samples[Channel.Speed].ToArray());
    }

    [Fact]
    public void TheLongestSignatureWins()
    {
        var longer = Good with { Name = "longer", Header = ["time", "power_w"] };

        Assert.Equal("longer", CsvFiles.Decode("time,power_w\n2026-10-05T06:00:00Z,1\n", Good, longer).SourceName);
        Assert.Equal("longer", CsvFiles.Decode("power_w,time\n1,2026-10-05T06:00:00Z\n", longer, Good).SourceName);
    }

    [Fact]
    public void TwoLayoutsThatFitEquallyWellRefuseTheFile() =>
        Assert.Equal("line 1: several layouts fit equally well: good, samples",
            CsvFiles.Refusal(CsvFiles.Decode("time,power_w\n2026-10-05T06:00:00Z,1\n", Good, BuiltInLayouts.Samples)));

    [Fact]
    public void ALayoutWithAnotherDelimiterDoesNotDisturb() =>
        Assert.Equal("mittaus", CsvFiles.Decode("aika;syke\n05.10.2026 09:00:00;1\n", BuiltInLayouts.Samples, CsvFiles.Finnish).SourceName);

    [Fact]
    public void WithoutLayoutsNothingIsGuessed() =>
        Assert.Equal("line 1: a CSV, but no layout is configured", CsvDecoder.Decode("a,b\n"u8.ToArray(), []).Problems[0].ToString());

    [Theory]
    [InlineData("running", "running", 0)]
    [InlineData("training/strength_training", "training/strength_training", 0)]
    [InlineData("", "generic", 0)]
    [InlineData("Stramm <b>", "generic", 1)]
    public void TheSportComesFromItsColumn(string cell, string expected, int warnings)
    {
        var file = CsvFiles.Decode($"time,power_w,sport\n2026-10-05T06:00:00Z,1,{cell}\n");

        Assert.Equal(expected, CsvFiles.Only(file).Sport.ToString());
        Assert.Equal(warnings, file.Problems.Count);
    }
}
