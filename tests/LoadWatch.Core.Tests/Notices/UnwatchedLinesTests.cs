using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

/// <summary>What no rule looks at stands below the group's table, a line each; whoever is watched as usual adds nothing.</summary>
public sealed class UnwatchedLinesTests
{
    [Fact]
    public void AUsualSquadHasNoLine() => Assert.Empty(Lines(Subject("a", "Ann"), Subject("b", "Ben")));

    [Fact]
    public void RulesThatLimitsTurnOffAreNamedOnceForTheGroup()
    {
        var squad = Squad with { Limits = new RuleLimits { Monotony = new MonotonyLimits { Enabled = false }, HardDays = new HardDaysLimits { Enabled = false } } };

        Assert.Equal(["not watched by the limits: monotony, hard days"], Lines(Subject("a", "Ann") with { Group = squad }, Subject("b", "Ben") with { Group = squad }));
    }

    [Fact]
    public void LimitsOfOnePersonNameThatPerson()
    {
        var own = Squad with { Limits = new RuleLimits { Monotony = new MonotonyLimits { Enabled = false } } };

        Assert.Equal(["not watched for Ann by the limits: monotony"], Lines(Subject("a", "Ann") with { Group = own }, Subject("b", "Ben")));
    }

    [Fact]
    public void ACoachIsNotToldOfRulesOfHealth()
    {
        var squad = Squad with { Limits = new RuleLimits { FunctionTest = new FunctionTestLimits { Enabled = false } } };

        Assert.Empty(Lines(Subject("a", "Ann") with { Group = squad }));
        Assert.Equal(["not watched by the limits: function test"], BriefBuilder.Build(Contact(ContactRole.Clinician), Today, [Subject("a", "Ann") with { Group = squad }], []).Groups[0].NotWatched);
    }

    [Fact]
    public void APlannedStateSaysWhatItMutes()
    {
        var light = InPlan(Subject("a", "Ann"), DayPlan.None with { Phases = [PlanWord.LightWeek] });

        Assert.Equal(["not watched for Ann in a light week: falling load, stimulus low"], Lines(light, Subject("b", "Ben")));
        Assert.Equal(["not watched in a light week: falling load, stimulus low"], Lines(light));
    }

    [Fact]
    public void WhoeverIsAwayIsToldInTheOwnRowAlone() =>
        Assert.Empty(Lines(InPlan(Subject("a", "Ann"), DayPlan.None with { Absence = AbsenceWord.Ill }), Subject("b", "Ben")));

    [Fact]
    public void LegsThatNoChannelSeesAreCountedFromFourPeopleOn()
    {
        var blind = Enumerable.Range(0, 4).Select(n => Blind(Subject($"p{n}", $"P {n}"))).ToArray();

        Assert.Equal(
            ["leg work cannot be seen for P 0 and P 1, so its gaps are not watched: logged sets, or power or running speed with their reference values, would tell"],
            Lines([.. blind[..2], Subject("x", "Xen")]));
        Assert.StartsWith("leg work cannot be seen for 4 of 5, so", Assert.Single(Lines([.. blind, Subject("x", "Xen")])), StringComparison.Ordinal);
    }

    [Fact]
    public void TheTextHasThemBelowTheTableAndInitialsCoverTheNames()
    {
        var brief = BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Blind(Subject("a", "Ann Alder")), Subject("b", "Ben Birch")], []);

        Assert.Contains("\n  Leg work cannot be seen for Ann Alder, so its gaps are not watched:", BriefText.Write(brief), StringComparison.Ordinal);
        var covered = MailNames.Of(brief, NamesShown.Initials, [Person("a", "Ann Alder"), Person("b", "Ben Birch")]);
        Assert.DoesNotContain("Alder", covered.Groups[0].NotWatched[0], StringComparison.Ordinal);
    }

    private static IReadOnlyList<string> Lines(params BriefSubject[] subjects) => BriefBuilder.Build(Contact(ContactRole.Coach), Today, subjects, []).Groups[0].NotWatched;

    private static BriefSubject InPlan(BriefSubject subject, DayPlan plan) => subject with { Days = [.. subject.Days.Select(day => day with { Plan = plan })] };

    private static BriefSubject Blind(BriefSubject subject) => subject with
    {
        Days = [.. subject.Days.Select(day => day with { Regions = new Dictionary<BodyRegion, RegionDay>() })],
    };
}
