using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.Findings;
using LoadWatch.People;

namespace LoadWatch.Service.Configuration;

/// <summary>
/// Limits of another file, over those in force: a whole <c>loadwatch.json</c>, or as much of one as holds <c>limits</c>, common or of groups. What it leaves out stays
/// as it is.
/// </summary>
public sealed class OtherLimits
{
    private readonly JsonElement root;

    private OtherLimits(JsonElement root) => this.root = root;

    /// <exception cref="ConfigurationException">Names every fault with file, line and the nearest right word.</exception>
    public static OtherLimits Read(string path, IReadOnlyDictionary<string, Group> groups)
    {
        var faults = new FaultList(Path.GetFileName(path));
        try
        {
            var json = File.ReadAllBytes(path);
            faults.Places = JsonPlaces.Of(json);
            using var document = JsonDocument.Parse(json, ConfigurationJson.DocumentOptions);
            faults.AddRange(KeyCheck.Faults(Path.GetFileName(path), document.RootElement, typeof(LoadWatchFile), faults.Places));
            faults.Stop();
            var limits = new OtherLimits(document.RootElement.Clone());
            foreach (var (at, reason) in limits.Places(groups).SelectMany(place => Faults(limits.Of(place.Group), place.At)).Distinct())
            {
                faults.Add(at, reason);
            }

            faults.Stop();
            return limits;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or JsonException)
        {
            throw new ConfigurationException(Path.GetFileName(path), e.Message);
        }
    }

    /// <summary>A group's limits as the file would have them.</summary>
    public RuleLimits Of(Group group)
    {
        var limits = JsonSerializer.SerializeToNode(group.Limits, ConfigurationJson.Options)!.AsObject();
        var own = Groups().FirstOrDefault(one => one.Element.TryGetProperty("id", out var id) && id.GetString() == group.Id);
        return Merge(Merge(limits, Part(root)), own.Element.ValueKind == JsonValueKind.Object ? Part(own.Element) : []).Deserialize<RuleLimits>(ConfigurationJson.Options)!;
    }

    private IEnumerable<(Group Group, string At)> Places(IReadOnlyDictionary<string, Group> groups) => groups.Values.Select(group =>
    {
        var own = Groups().FirstOrDefault(one => one.Element.TryGetProperty("id", out var id) && id.GetString() == group.Id);
        return (group, own.Element.ValueKind == JsonValueKind.Object && own.Element.TryGetProperty("limits", out _) ? $"$.groups[{own.Place}].limits" : "$.limits");
    });

    private static IEnumerable<(string At, string Reason)> Faults(RuleLimits limits, string at) =>
        RangeCheck.Faults(limits, at).Concat(LimitsCheck.Faults(limits).Select(fault => ($"{at}.{fault.Path}", fault.Reason)));

    private IEnumerable<(JsonElement Element, int Place)> Groups() =>
        root.TryGetProperty("groups", out var groups) ? groups.EnumerateArray().Select((element, place) => (element, place)) : [];

    private static JsonObject Part(JsonElement owner) => owner.TryGetProperty("limits", out var limits) ? JsonObject.Create(limits)! : [];

    private static JsonObject Merge(JsonObject under, JsonObject over)
    {
        foreach (var (key, value) in over)
        {
            under[key] = value is JsonObject inner && under[key] is JsonObject below ? Merge((JsonObject)below.DeepClone(), inner) : value?.DeepClone();
        }

        return under;
    }
}
