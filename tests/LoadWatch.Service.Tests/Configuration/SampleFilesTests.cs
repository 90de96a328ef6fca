using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using NodaTime;

namespace LoadWatch.Service.Tests.Configuration;

/// <summary>The files in <c>config/</c> are a contract: keys and defaults may not drift from the program.</summary>
public sealed class SampleFilesTests
{
    [Fact]
    public void TheSampleFileHoldsEveryKeyAtItsDefault()
    {
        var sample = JsonNode.Parse(File.ReadAllText(Repository.Config("loadwatch.json")), documentOptions: ConfigurationJson.DocumentOptions)!.AsObject();
        sample.Remove("$schema");
        var defaults = JsonSerializer.SerializeToNode(new LoadWatchFile(), ConfigurationJson.Options)!.AsObject();
        defaults.Remove("$schema");

        Assert.Equal(Leaves(defaults), Leaves(sample));
    }

    [Fact]
    public void TheSampleFileBindsToTheDefaults()
    {
        var bound = JsonSerializer.Deserialize<LoadWatchFile>(File.ReadAllText(Repository.Config("loadwatch.json")), ConfigurationJson.Options)!;

        Assert.Equal(
            JsonSerializer.Serialize(new LoadWatchFile { Schema = "./loadwatch.schema.json" }, ConfigurationJson.Options),
            JsonSerializer.Serialize(bound, ConfigurationJson.Options));
    }

    [Fact]
    public void EveryLineOfTheSampleFileThatHoldsAValueIsCommented()
    {
        string[] plain = ["brief_days"]; // Its words say what it is.
        var bare = File.ReadLines(Repository.Config("loadwatch.json"))
            .Where(line => line.Contains("\": ", StringComparison.Ordinal) && !line.TrimEnd().EndsWith('{') && !line.TrimEnd().EndsWith('['))
            .Where(line => !line.Contains("//", StringComparison.Ordinal) && !line.TrimStart().StartsWith("\"layouts\"", StringComparison.Ordinal))
            .Where(line => !plain.Any(word => line.Contains(word, StringComparison.Ordinal)));

        Assert.Empty(bare);
    }

    [Fact]
    public void TheSampleFilesReadTogetherAndNameEveryAnchorKind()
    {
        using var folder = new ConfigurationFolder();
        foreach (var name in new[] { "loadwatch.json", "roster.csv", "anchors.csv", "devices.csv" })
        {
            folder.Write(name, File.ReadAllBytes(Repository.Config(name)));
        }

        var read = folder.Read();

        Assert.Equal(["aada", "lumi", "veikko"], read.People.Keys.Order(StringComparer.Ordinal));
        var kinds = Enum.GetValues<AnchorKind>().Where(kind => read.People.Keys.Any(id =>
            read.Anchors.On(new LocalDate(2026, 12, 31), id, kind, kind == AnchorKind.OneRepetitionMax ? "leg_press" : null) is not null));
        Assert.Equal(Enum.GetValues<AnchorKind>(), kinds);
    }

    [Theory]
    [InlineData("roster.csv", "person,name,group,birth_year,sex,time_zone,aliases,heart_rate_valid")]
    [InlineData("devices.csv", "serial,person,from,to,session")]
    [InlineData("anchors.csv", "person,date,anchor,value,unit,source,exercise,machine,sport")]
    public void TheSampleTablesHoldEveryColumn(string name, string columns) => Assert.Equal(columns, File.ReadLines(Repository.Config(name)).First());

    /// <summary>Path and value of every leaf, so that a difference names its key.</summary>
    private static List<string> Leaves(JsonNode? node, string path = "$") => node switch
    {
        JsonObject { Count: > 0 } inner => [.. inner.SelectMany(pair => Leaves(pair.Value, $"{path}.{pair.Key}"))],
        JsonArray { Count: > 0 } list => [.. list.SelectMany((item, i) => Leaves(item, $"{path}[{i}]"))],
        JsonValue value when value.GetValueKind() == JsonValueKind.Number => [FormattableString.Invariant($"{path} = {value.Deserialize<double>()}")],
        _ => [$"{path} = {node?.ToJsonString() ?? "null"}"],
    };
}
