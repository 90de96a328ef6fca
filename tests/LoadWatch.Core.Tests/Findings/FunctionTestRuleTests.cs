using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Rows;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

public class FunctionTestRuleTests
{
    // Operators and cut-offs: Cruz-Jentoft et al. 2019, Age Ageing 48:16-31 (EWGSOP2); chair stands, battery and walk from memory.
    [Theory]
    [InlineData("grip_strength", Sex.Male, 27.0, false)]
    [InlineData("grip_strength", Sex.Male, 26.9, true)]
    [InlineData("grip_strength", Sex.Female, 16.0, false)]
    [InlineData("grip_strength", Sex.Female, 15.9, true)]
    [InlineData("grip_strength", null, 5.0, false)]
    [InlineData("chair_stands_5", Sex.Female, 15.0, false)]
    [InlineData("chair_stands_5", Sex.Female, 15.1, true)]
    [InlineData("gait_speed", Sex.Female, 0.81, false)]
    [InlineData("gait_speed", Sex.Female, 0.80, true)]
    [InlineData("timed_up_and_go", Sex.Female, 19.9, false)]
    [InlineData("timed_up_and_go", Sex.Female, 20.0, true)]
    [InlineData("short_physical_performance_battery", Sex.Female, 9, false)]
    [InlineData("short_physical_performance_battery", Sex.Female, 8, true)]
    [InlineData("walk_400_m", Sex.Female, 359, false)]
    [InlineData("walk_400_m", Sex.Female, 360, true)]
    [InlineData("a_test_of_their_own", Sex.Female, 1, false)]
    public void CutOffsKeepTheOperatorsOfTheirSource(string test, Sex? sex, double value, bool told) =>
        Assert.Equal(told, Evaluate(sex, Test(3, test, value)).Count > 0);

    [Theory]
    [InlineData("grip_strength", 30.0, 25.0, false)]
    [InlineData("grip_strength", 30.0, 24.9, true)]
    [InlineData("chair_stands_5", 9.0, 11.5, false)]
    [InlineData("chair_stands_5", 9.0, 11.6, true)]
    [InlineData("gait_speed", 1.3, 1.2, false)]
    [InlineData("gait_speed", 1.3, 1.19, true)]
    public void AChangeForTheWorseBeyondTheErrorIsTold(string test, double before, double after, bool told) =>
        Assert.Equal(told, Evaluate(Sex.Female, Test(3, test, before), Test(10, test, after)).Count > 0);

    [Fact]
    public void ItStandsUntilTheNextTestOfItsKind()
    {
        var findings = Evaluate(Sex.Male, Test(3, "grip_strength", 25), Test(8, "gait_speed", 1.2), Test(10, "grip_strength", 28));

        Assert.Equal((On(3), On(9)), (findings[0].Date, findings[^1].Date));
        Assert.Equal("Grip strength 25 kg on 8 January: below the published cut-off of 27 kg.", findings[0].Text);
    }

    [Fact]
    public void TheBetterHandCounts() => Assert.Empty(Evaluate(Sex.Male, Test(3, "grip_strength", 25, "left"), Test(3, "grip_strength", 29, "right")));

    [Fact]
    public void AChairStandThatCouldNotBeDoneIsTold()
    {
        var unable = new DatedTest(On(3), new TestRow("chair_stands_5", null, null, null, null, TestOutcome.Unable, null, null, 0.43));

        Assert.Equal("Five chair stands on 8 January: could not be done.", Evaluate(Sex.Female, unable)[0].Text);
    }

    [Theory]
    [InlineData("sarcopenia")]
    [InlineData("frail")]
    [InlineData("risk")]
    [InlineData("diagnos")]
    public void NoWordJudgesThePerson(string word) => Assert.All(
        Evaluate(Sex.Male, Test(3, "grip_strength", 20), Test(3, "gait_speed", 0.5)),
        finding => Assert.DoesNotContain(word, finding.Text + finding.Evidence.Formula, StringComparison.OrdinalIgnoreCase));

    private static DatedTest Test(int day, string test, double value, string? hand = null) =>
        new(On(day), new TestRow(test, value, null, null, null, null, hand, null, null));

    private static List<Finding> Evaluate(Sex? sex, params DatedTest[] tests)
    {
        var days = Enumerable.Range(0, 20).Select(day => new Day { Person = "anna", Date = On(day), State = DayState.Unknown }).ToList();
        return new FunctionTestRule().Evaluate(new RuleSubject(Anna with { Sex = sex }, days, new RuleLimits()) { Tests = tests }).ToList();
    }
}
