using System.Text.Json.Nodes;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class ConfigurationSchemaTests
{
    private const string Refresh =
        "config/loadwatch.schema.json is not what the program writes. To refresh it: "
        + "dotnet run --project src/LoadWatch.Service -- init --dir NEW_FOLDER, then copy NEW_FOLDER/loadwatch.schema.json to config/.";

    private static readonly JsonNode Schema = JsonNode.Parse(ConfigurationSchema.Write())!;

    [Fact]
    public void TheCommittedSchemaIsTheOneThatTheProgramWrites() =>
        Assert.True(File.ReadAllText(Repository.Config("loadwatch.schema.json")).ReplaceLineEndings("\n") == ConfigurationSchema.Write(), Refresh);

    [Fact]
    public void ARangeAndADefaultAndADescriptionAreInTheSchema()
    {
        var raise = Schema["properties"]!["limits"]!["properties"]!["load_ratio"]!["properties"]!["raise"]!;

        Assert.Equal((1.0, 10.0, 2.2), ((double)raise["minimum"]!, (double)raise["maximum"]!, (double)raise["default"]!));
        Assert.StartsWith("Raised at this uncoupled ratio or above.", (string)raise["description"]!, StringComparison.Ordinal);
    }

    [Fact]
    public void AWordOfAListIsInTheSchemaAndNoOtherIs()
    {
        var days = Schema["properties"]!["contacts"]!["items"]!["properties"]!["brief_days"]!["items"]!["enum"]!.AsArray();

        Assert.Equal(["monday", "tuesday", "wednesday", "thursday", "friday", "saturday", "sunday"], days.Select(day => (string)day!));
    }

    [Fact]
    public void NoObjectOfTheFileTakesKeysThatItDoesNotKnow() =>
        Assert.All(Objects(Schema).Where(node => node.ContainsKey("properties")), node => Assert.False((bool)node["additionalProperties"]!));

    [Fact]
    public void EveryKeyIsDescribed()
    {
        var bare = Objects(Schema).Where(node => node["properties"] is JsonObject)
            .SelectMany(node => node["properties"]!.AsObject())
            .Where(pair => pair.Value is not JsonObject value || !value.ContainsKey("description"))
            .Select(pair => pair.Key);

        Assert.Empty(bare);
    }

    [Fact]
    public void ThereAreNoDefaultsInTheLimitsOfAGroup()
    {
        var limits = Schema["properties"]!["groups"]!["items"]!["properties"]!["limits"]!;

        Assert.Contains(Objects(limits), node => node.ContainsKey("minimum"));
        Assert.DoesNotContain(Objects(limits), node => node.ContainsKey("default"));
    }

    private static IEnumerable<JsonObject> Objects(JsonNode? node) => node switch
    {
        JsonObject inner => inner.SelectMany(pair => Objects(pair.Value)).Prepend(inner),
        JsonArray list => list.SelectMany(Objects),
        _ => [],
    };
}
