using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.Findings;
using LoadWatch.People;

namespace LoadWatch.Service.Configuration;

/// <summary>
/// Limits of another file, over those in force: a whole <c>loadwatch.json</c>, or as much of one as holds <c>limits</c>, common, of groups or of people. What it leaves out
/// stays as it is; what a person has as own limits stays so unless the file says otherwise of that person.
/// </summary>
public sealed class OtherLimits
{
    private readonly JsonElement root;

    private OtherLimits(JsonElement root) => this.root = root;

    /// <param name="people">The roster; limits of nobody on it are passed over.</param>
    /// <exception cref="ConfigurationException">Names every fault with file, line and the nearest right word.</exception>
    public static OtherLimits Read(string path, IReadOnlyDictionary<string, Group> groups, IReadOnlyDictionary<string, Person> people)
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
            var places = limits.Places(groups).Select(place => (Limits: limits.Of(place.Group), place.At))
                .Concat(limits.Own(people).Select(own => (Limits: limits.Of(own.Id, groups[people[own.Id].Group], limits), own.At)));
            foreach (var (at, reason) in places.SelectMany(place => Faults(place.Limits, place.At)).Distinct())
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

    /// <summary>A person's limits as the file would have them.</summary>
    /// <param name="id">Of the person, compared without regard to case.</param>
    /// <param name="group">With the limits of the group.</param>
    /// <param name="today">The file in force, for the person's own limits.</param>
    public RuleLimits Of(string id, Group group, OtherLimits today) =>
        LimitsMerge.Merge(LimitsMerge.Merge(Json(Of(group)), today.OfPerson(id)), OfPerson(id)).Deserialize<RuleLimits>(ConfigurationJson.Options)!;

    /// <summary>A group's limits as the file would have them.</summary>
    public RuleLimits Of(Group group)
    {
        var limits = LimitsMerge.Merge(Json(group.Limits), LimitsMerge.Limits(root));
        var merged = Own(group) is { } own ? LimitsMerge.Merge(LimitsMerge.Merge(limits, LimitsMerge.OfKind(own.Element)), LimitsMerge.Limits(own.Element)) : limits;
        return merged.Deserialize<RuleLimits>(ConfigurationJson.Options)!;
    }

    private static JsonObject Json(RuleLimits limits) => JsonSerializer.SerializeToNode(limits, ConfigurationJson.Options)!.AsObject();

    private IEnumerable<(string Id, string At)> Own(IReadOnlyDictionary<string, Person> people) => root.TryGetProperty("people", out var owners)
        ? owners.EnumerateObject().Where(owner => people.ContainsKey(owner.Name)).Select(owner => (owner.Name, $"$.people.{owner.Name}.limits"))
        : [];

    private JsonObject OfPerson(string id) => root.TryGetProperty("people", out var people)
        ? people.EnumerateObject().Where(person => string.Equals(person.Name, id, StringComparison.OrdinalIgnoreCase)).Select(person => LimitsMerge.Limits(person.Value)).FirstOrDefault([])
        : [];

    private IEnumerable<(Group Group, string At)> Places(IReadOnlyDictionary<string, Group> groups) => groups.Values
        .Select(group => (group, Own(group) is { } own && own.Element.TryGetProperty("limits", out _) ? $"$.groups[{own.Place}].limits" : "$.limits"));

    /// <summary>What the file says of the group alone.</summary>
    private (JsonElement Element, int Place)? Own(Group group) => root.TryGetProperty("groups", out var groups)
        ? groups.EnumerateArray()
            .Select((element, place) => ((JsonElement, int)?)(element, place))
            .FirstOrDefault(one => one!.Value.Item1.TryGetProperty("id", out var id) && id.GetString() == group.Id)
        : null;

    private static IEnumerable<(string At, string Reason)> Faults(RuleLimits limits, string at) =>
        RangeCheck.Faults(limits, at).Concat(LimitsCheck.Faults(limits).Select(fault => ($"{at}.{fault.Path}", fault.Reason)));
}
