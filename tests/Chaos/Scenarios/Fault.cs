namespace LoadWatch.Chaos.Scenarios;

/// <summary>One fault of the catalogue, and where it is shown that it does no harm: by scenarios, by tests in process, or not at all, with the reason.</summary>
/// <param name="Id">A letter for the section and the number: A files arriving, B content, C time, D storage, F mail, G people and configuration.</param>
/// <param name="Tests">Classes, or methods of classes, below <c>tests/</c>; blank for none.</param>
/// <param name="Note">What is not provoked, and why; blank where nothing is left out.</param>
public sealed record Fault(string Id, string What, string Tests = "", string Note = "")
{
    public IReadOnlyList<Scenario> Scenarios => [.. Catalogue.All.Where(scenario => scenario.Faults.Split(' ').Contains(Id, StringComparer.Ordinal))];

    /// <summary>A row of the table of <c>chaos list</c>.</summary>
    public string Row() => $"| {Id} | {What} | {string.Join(", ", Scenarios.Select(scenario => $"`{scenario.Id}`"))} | {string.Join(", ", TestNames.Select(name => $"`{name}`"))} | {Note} |";

    public IReadOnlyList<string> TestNames => Tests.Split(' ', StringSplitOptions.RemoveEmptyEntries);
}
