using System.Text.Json;
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
        var limits = LimitsMerge.Merge(JsonSerializer.SerializeToNode(group.Limits, ConfigurationJson.Options)!.AsObject(), LimitsMerge.Limits(root));
        var merged = Own(group) is { } own ? LimitsMerge.Merge(LimitsMerge.Merge(limits, LimitsMerge.OfKind(own.Element)), LimitsMerge.Limits(own.Element)) : limits;
        return merged.Deserialize<RuleLimits>(ConfigurationJson.Options)!;
    }

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
