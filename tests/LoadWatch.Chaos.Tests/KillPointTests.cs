using System.Text.RegularExpressions;
using LoadWatch.Chaos.Processes;
using LoadWatch.Chaos.Scenarios;

namespace LoadWatch.Chaos.Tests;

public sealed partial class KillPointTests
{
    [Fact]
    public void EveryKillPointOfTheSourceIsTried()
    {
        Assert.SkipWhen(Repository.Root is null, "the tests do not run inside the repository");
        var named = Directory.EnumerateFiles(Path.Combine(Repository.Root!, "src"), "*.cs", SearchOption.AllDirectories)
            .SelectMany(path => KillPointCall().Matches(File.ReadAllText(path)))
            .Select(match => match.Groups["name"].Value);

        Assert.Equal(NamedKills.OfSweep.Union(NamedKills.OfRebuild, StringComparer.Ordinal).Order(StringComparer.Ordinal), named.Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void ScenariosHaveNamesOfTheirOwnAndTellTheirFaults()
    {
        Assert.Equal(Catalogue.All.Count, Catalogue.All.DistinctBy(scenario => scenario.Id, StringComparer.Ordinal).Count());
        Assert.All(Catalogue.All, scenario => Assert.Matches("^[A-G][0-9]+( [A-G][0-9]+)*$", scenario.Faults));
    }

    [GeneratedRegex("KillPoint\\.Pass\\(\"(?<name>[a-z]+)\"\\)", RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 1000)]
    private static partial Regex KillPointCall();
}
