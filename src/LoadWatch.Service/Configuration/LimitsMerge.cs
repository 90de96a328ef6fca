using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.Findings;

namespace LoadWatch.Service.Configuration;

/// <summary>
/// The limits of a group or a person: only the keys that it writes are its own. The others are, for a person, those of the group; for a group, what its kind turns off, the common ones of
/// the file, then the built-in defaults.
/// </summary>
public static class LimitsMerge
{
    private static readonly string DefaultGroup = new GroupEntry().Id;

    /// <param name="root">The whole file.</param>
    /// <returns>The limits of each group of the file, in file order.</returns>
    public static IReadOnlyList<RuleLimits> OfGroups(JsonElement root) => [.. Groups(root).Select(group => Read(group.Limits))];

    /// <param name="root">The whole file.</param>
    /// <param name="groupOf">The group of a person by id; null for nobody of the roster.</param>
    /// <returns>The limits of each person who has own ones, by id as written; those of nobody are left out.</returns>
    public static IReadOnlyDictionary<string, RuleLimits> OfPeople(JsonElement root, Func<string, string?> groupOf)
    {
        var groups = Groups(root).ToDictionary(group => group.Id, group => group.Limits, StringComparer.Ordinal);
        return root.TryGetProperty("people", out var people)
            ? people.EnumerateObject()
                .Where(person => Limits(person.Value).Count > 0 && groupOf(person.Name) is not null)
                .ToDictionary(
                    person => person.Name,
                    person => Read(Merge(groups[groupOf(person.Name)!].DeepClone().AsObject(), Limits(person.Value))),
                    StringComparer.OrdinalIgnoreCase)
            : new Dictionary<string, RuleLimits>();
    }

    private static List<(string Id, JsonObject Limits)> Groups(JsonElement root)
    {
        var common = Limits(root);
        return root.TryGetProperty("groups", out var groups)
            ? [.. groups.EnumerateArray().Select(group => (
                group.TryGetProperty("id", out var id) ? id.GetString()! : DefaultGroup,
                Merge(Merge(common.DeepClone().AsObject(), OfKind(group)), Limits(group))))]
            : [(DefaultGroup, common)];
    }

    /// <summary>What a clinic's visits are not about.</summary>
    internal static JsonObject OfKind(JsonElement group) =>
        group.TryGetProperty("kind", out var kind) && Enum.Parse<GroupKind>(kind.GetString()!, ignoreCase: true) == GroupKind.Clinic
            ? new JsonObject(RuleBook.All
                .Where(rule => !rule.LimitsOf(RuleLimits.OfClinic()).Enabled)
                .Select(rule => KeyValuePair.Create(rule.Name, (JsonNode?)new JsonObject { ["enabled"] = false })))
            : [];

    private static RuleLimits Read(JsonObject limits) => limits.Deserialize<RuleLimits>(ConfigurationJson.Options)!;

    internal static JsonObject Limits(JsonElement owner) =>
        owner.TryGetProperty("limits", out var limits) && limits.ValueKind == JsonValueKind.Object ? JsonObject.Create(limits)! : [];

    internal static JsonObject Merge(JsonObject under, JsonObject over)
    {
        foreach (var (key, value) in over)
        {
            under[key] = value is JsonObject inner && under[key] is JsonObject below ? Merge(below, inner) : value?.DeepClone();
        }

        return under;
    }
}
