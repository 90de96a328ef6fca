using System.ComponentModel.DataAnnotations;
using LoadWatch.Days;
using LoadWatch.Findings;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

public class RuleBookTests
{
    [Fact]
    public void RulesAreNamedAndInOrder() => Assert.Equal(["load_ratio", "stimulus_gap", "silence"], RuleBook.All.Select(rule => rule.Name));

    [Fact]
    public void WithoutDaysThereAreNoFindings() => Assert.Empty(RuleBook.Evaluate(new RuleSubject(Anna, [], Watched.Defaults)));

    [Fact]
    public void FindingsAreSortedByDateRuleAndRegion()
    {
        var found = Busy();

        Assert.Equal(found.OrderBy(finding => finding.Date).ThenBy(finding => finding.Rule, StringComparer.Ordinal), found);
        Assert.Equal(["load_ratio", "silence", "stimulus_gap"], found.Where(finding => finding.Date == On(60)).Select(finding => finding.Rule));
    }

    [Fact]
    public void EveryFindingHasItsRunItsEvidenceAndOneSentence() => Assert.All(Busy(), finding =>
    {
        Assert.True(finding.Since <= finding.Date);
        Assert.NotEmpty(finding.Evidence.Formula);
        Assert.NotEmpty(finding.Evidence.Source);
        Assert.NotEmpty(finding.Evidence.Inputs);
        Assert.EndsWith(".", finding.Text, StringComparison.Ordinal);
        Assert.DoesNotContain("Anna", finding.Text, StringComparison.OrdinalIgnoreCase);
    });

    /// <summary>I-13.</summary>
    [Theory]
    [InlineData("risk")]
    [InlineData("injur")]
    [InlineData("readiness")]
    [InlineData("debt")]
    [InlineData("safe")]
    [InlineData("danger")]
    public void WordsDescribeChangeOnly(string word) =>
        Assert.All(Busy(), finding => Assert.DoesNotContain(word, finding.Text + finding.Evidence.Formula, StringComparison.OrdinalIgnoreCase));

    [Fact]
    public void TheGroupsUnitIsPassedOn() =>
        Assert.Contains(
            RuleBook.Evaluate(new RuleSubject(Anna, BusyDays(), Watched.Defaults) { LoadUnit = "kJ" }),
            finding => finding.Text.Contains(" kJ)", StringComparison.Ordinal));

    [Fact]
    public void DefaultLimitsLieInTheirRanges()
    {
        RuleLimits limits = new();
        object[] parts = [limits.LoadRatio, limits.StimulusGap, limits.Silence];

        Assert.All(parts, part => Validator.ValidateObject(part, new ValidationContext(part), validateAllProperties: true));
        Assert.True(limits.LoadRatio.Return < limits.LoadRatio.Raise);
    }

    /// <summary>46 steady days with heavy leg work on the first, then a week of more than twice the load, then nothing.</summary>
    private static IReadOnlyList<Day> BusyDays() => Build(60, [
        .. Enumerable.Range(0, 53).Select(day => Activity(day, day < 46 ? 100 : 220, stimulus: Bouts(day == 0 ? 5 : 1)))]);

    private static IReadOnlyList<Finding> Busy() => RuleBook.Evaluate(new RuleSubject(Anna, BusyDays(), Watched.Defaults));
}
