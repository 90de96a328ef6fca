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
