namespace LoadWatch.Chaos.Scenarios;

/// <summary>Every scenario there is, in the order in which all of them run.</summary>
public static class Catalogue
{
    public static IReadOnlyList<Scenario> All { get; } =
    [
        .. NamedKills.All,
        .. RandomKills.All,
        .. Arriving.All,
    ];

    /// <exception cref="ArgumentException">There is none of that name.</exception>
    public static Scenario Find(string id) =>
        All.FirstOrDefault(scenario => scenario.Id == id) ?? throw new ArgumentException($"there is no scenario \"{id}\"; chaos list names them", nameof(id));
}
