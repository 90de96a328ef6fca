using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using LoadWatch.Rows;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

public class TestOverdueRuleTests
{
    private static readonly TestOverdueLimits Monthly = new() { IntervalDays = 30 };

    [Fact]
    public void ATestIsDueOnceTheIntervalIsOver()
    {
        var findings = Evaluate(Monthly, 60, Test(5), Test(50));

        Assert.Equal((On(36), On(49), 14), (findings[0].Date, findings[^1].Date, findings.Count));
        Assert.Equal("Gait speed is due: last on 10 January, to be done every 30 days.", findings[0].Text);
        Assert.Equal((31, 30, "days", "gait_speed", On(36)), (findings[0].Value, findings[0].Limit, findings[0].Unit, findings[0].Quantity, findings[0].Since));
    }

    [Fact]
    public void WhoNeverHadATestIsAskedForThoseOnly()
    {
        Assert.Empty(Evaluate(Monthly, 60));
        var findings = Evaluate(Monthly with { Tests = ["grip_strength"] }, 60);

        Assert.Equal((On(31), "Grip strength is due: none since 5 January, to be done every 30 days."), (findings[0].Date, findings[0].Text));
    }

    [Fact]
    public void ATestThatCouldNotBeDoneEndsIt() =>
        Assert.Equal(On(39), Evaluate(Monthly, 60, Test(5), new DatedTest(On(40), new TestRow("gait_speed", null, null, null, null, TestOutcome.Unable, null, null, null)))[^1].Date);

    [Fact]
    public void InAnAbsenceItIsSuppressed()
    {
        var days = Days(60).Select(day => day.Date >= On(40) && day.Date < On(45) ? day with { Plan = DayPlan.None with { Absence = AbsenceWord.Away } } : day).ToList();
        var findings = new TestOverdueRule().Evaluate(new RuleSubject(Anna, days, new RuleLimits { TestOverdue = Monthly }) { Tests = [Test(5)] }).ToList();

        Assert.Equal([On(40), On(41), On(42), On(43), On(44)], findings.Where(finding => finding.Severity == Severity.Suppressed).Select(finding => finding.Date));
        Assert.EndsWith("Not watched: away since 14 February.", findings[4].Text, StringComparison.Ordinal);
    }

    private static DatedTest Test(int day) => new(On(day), new TestRow("gait_speed", 1.2, null, null, null, null, null, null, null));

    private static List<Day> Days(int count) => [.. Enumerable.Range(0, count).Select(day => new Day { Person = "anna", Date = On(day), State = DayState.Unknown })];

    private static List<Finding> Evaluate(TestOverdueLimits limits, int days, params DatedTest[] tests) =>
        [.. new TestOverdueRule().Evaluate(new RuleSubject(Anna, Days(days), new RuleLimits { TestOverdue = limits }) { Tests = tests })];
}
