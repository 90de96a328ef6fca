using System.Globalization;
using LoadWatch.Chaos.Processes;
using LoadWatch.Chaos.Scenarios;

namespace LoadWatch.Chaos.Tests;

/// <summary>The catalogue of faults is whole, and whatever it points to is there.</summary>
public sealed class FaultsTests
{
    /// <summary>First and last number of each section; section E is about several machines.</summary>
    private static readonly (char Section, int First, int Last)[] Sections = [('A', 1, 28), ('B', 29, 47), ('C', 48, 56), ('D', 57, 74), ('F', 84, 93), ('G', 94, 97)];

    [Fact]
    public void EveryFaultIsThereOnceInOrder() => Assert.Equal(
        Sections.SelectMany(section => Enumerable.Range(section.First, section.Last - section.First + 1).Select(number => section.Section + number.ToString(CultureInfo.InvariantCulture))),
        Faults.All.Select(fault => fault.Id));

    [Fact]
    public void EveryFaultIsProvokedProvedOrLeftOutForAReason() =>
        Assert.All(Faults.All, fault => Assert.True(fault.Scenarios.Count + fault.TestNames.Count > 0 || fault.Note.Length > 0, fault.Id));

    [Fact]
    public void EveryScenarioIsAboutFaultsOfTheCatalogue() => Assert.Empty(
        Catalogue.All.SelectMany(scenario => scenario.Faults.Split(' ')).Except(Faults.All.Select(fault => fault.Id), StringComparer.Ordinal));

    [Fact]
    public void TheReadmeHoldsTheTable()
    {
        Assert.SkipWhen(Repository.Root is null, "the tests do not run inside the repository");
        var readme = File.ReadAllText(Path.Combine(Repository.Root!, "tests", "README.md"));
        Assert.All(Faults.All, fault => Assert.Contains(fault.Row(), readme, StringComparison.Ordinal));
    }

    [Fact]
    public void EveryTestThatProvesAFaultIsThere()
    {
        Assert.SkipWhen(Repository.Root is null, "the tests do not run inside the repository");
        var files = Directory.EnumerateFiles(Path.Combine(Repository.Root!, "tests"), "*Tests.cs", SearchOption.AllDirectories).ToList();
        Assert.All(Faults.All.SelectMany(fault => fault.TestNames), name =>
        {
            var (file, method) = (name.Split('.')[0], name.Split('.').ElementAtOrDefault(1));
            var found = files.Find(path => path.EndsWith($"/{file}.cs", StringComparison.Ordinal));
            Assert.True(found is not null, name);
            Assert.Contains(method is null ? $"class {Path.GetFileName(file)}" : $" {method}(", File.ReadAllText(found), StringComparison.Ordinal);
        });
    }
}
