using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class RoleViewTests
{
    [Theory]
    [InlineData(ContactRole.Coach, false, "away", "away", false)]
    [InlineData(ContactRole.FrontDesk, false, "away", "away", false)]
    [InlineData(ContactRole.Physiotherapist, true, "ill", "injured", false)]
    [InlineData(ContactRole.Clinician, true, "ill", "injured", true)]
    [InlineData(ContactRole.Self, true, "ill", "injured", true)]
    public void EachRoleSeesItsPart(ContactRole role, bool health, string ill, string injured, bool functionTest)
    {
        var view = RoleView.Of(role);

        Assert.Equal(
            (health, ill, injured, "away", functionTest),
            (view.ShowsHealth, view.Word(AbsenceWord.Ill), view.Word(AbsenceWord.Injured), view.Word(AbsenceWord.Away), view.ShowsRule("function_test")));
        Assert.Equal(functionTest, view.ShowsRule("test_overdue"));
        Assert.All(RuleBook.All.Where(rule => !rule.Record.IsOfHealth), rule => Assert.True(view.ShowsRule(rule.Name)));
    }

    [Fact]
    public void WhoReadsAsSelfAboutSeveralPeopleSeesNoMoreThanACoach()
    {
        Assert.True(RoleView.Of(ContactRole.Self, 1).ShowsHealth);
        Assert.False(RoleView.Of(ContactRole.Self, 2).ShowsHealth);
        Assert.True(RoleView.Of(ContactRole.Clinician, 2).ShowsHealth);

        var test = News("ann", FunctionTestRule.RuleName, null, Severity.Warning, AlertState.Unacknowledged, "chair stand", isNew: true);
        BriefSubject[] people = [Subject("ann", "Ann", test), Subject("ben", "Ben")];
        Assert.Single(BriefBuilder.Build(Oneself("ann"), Today, people, []).Flagged);
        Assert.Empty(BriefBuilder.Build(Contact(ContactRole.Self), Today, people, []).Flagged);
    }
}
