using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.Findings;

namespace LoadWatch.Service.Configuration;

/// <summary>A group's limits: only the keys that it writes are its own, the others are the common ones of the file, then the built-in defaults.</summary>
public static class LimitsMerge
{
    /// <param name="root">The whole file.</param>
    /// <returns>The limits of each group of the file, in file order.</returns>
    public static IReadOnlyList<RuleLimits> OfGroups(JsonElement root)
    {
        var common = Limits(root);
        return root.TryGetProperty("groups", out var groups)
            ? groups.EnumerateArray().Select(group => Read(Merge(common.DeepClone().AsObject(), Limits(group)))).ToList()
            : [Read(common)];
    }

    private static RuleLimits Read(JsonObject limits) => limits.Deserialize<RuleLimits>(ConfigurationJson.Options)!;

    private static JsonObject Limits(JsonElement owner) =>
        owner.TryGetProperty("limits", out var limits) && limits.ValueKind == JsonValueKind.Object ? JsonObject.Create(limits)! : [];

    private static JsonObject Merge(JsonObject under, JsonObject over)
    {
        foreach (var (key, value) in over)
        {
            under[key] = value is JsonObject inner && under[key] is JsonObject below ? Merge(below, inner) : value?.DeepClone();
        }

        return under;
    }
}
