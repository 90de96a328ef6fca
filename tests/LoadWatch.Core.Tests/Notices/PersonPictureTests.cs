using LoadWatch.Days;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class PersonPictureTests
{
    [Fact]
    public void ItHolds56DatesUpToTheBriefsLastOne()
    {
        var picture = Of(QuietDays("a", 60));

        Assert.Equal(56, picture.Days.Count);
        Assert.Equal((new LocalDate(2026, 1, 4), Yesterday), (picture.First, picture.Last));
        Assert.Equal(Enumerable.Range(0, 56).Select(picture.First.PlusDays), picture.Days.Select(day => day.Date));
        Assert.Equal("4 Jan to 28 Feb, AU a day; grey: usual weeks", picture.Caption);
    }

    [Fact]
    public void DatesBeforeTheRecordAreUnknownNotNought()
    {
        var picture = Of(QuietDays("a", 3));

        Assert.All(picture.Days.Take(53), day => Assert.Equal((false, null, null), (day.Known, day.Load, day.HeavyLegs)));
        Assert.Equal([80, 80, 80], picture.Days.Skip(53).Select(day => day.Load));
        Assert.All(picture.WeekLoads, Assert.Null);
        Assert.Null(picture.Usual);
    }

    // Weeks of 100, 200, ... 800 before the last one: h = 7 x 0.25 = 1.75 and 7 x 0.75 = 5.25 of the ordered eight give 275 and 625. By hand.
    [Fact]
    public void TheUsualWeeksAreTheMiddleHalfOfTheEightBeforeTheLast()
    {
        var picture = Of(Trends("a", 90, back => back % 7 == 0 ? 100 * (back / 7) : 0, _ => false));

        Assert.Equal(new UsualWeeks(275, 625, 8), picture.Usual);
        Assert.Equal([700, 600, 500, 400, 300, 200, 100, 0], picture.WeekLoads);
    }

    [Fact]
    public void TheLastWeekDoesNotMoveTheUsualOnes() =>
        Assert.Equal(Of(QuietDays("a", 90)).Usual, Of(Trends("a", 90, back => back < 7 ? 900 : back % 4 == 3 ? 0 : 80, _ => false)).Usual);

    [Theory]
    [InlineData(32, false)]
    [InlineData(33, true)]
    public void FourOrdinaryWeeksAreNeeded(int days, bool known) => Assert.Equal(known, Of(Trends("a", days, _ => 50, _ => false)).Usual is not null);

    [Fact]
    public void WeeksSetAsideByPlanOrAnswersAreNotUsual()
    {
        var away = Trends("a", 90, back => back is >= 14 and < 28 ? 5 : 50, _ => false)
            .Select(day => day.Date > Yesterday.PlusDays(-28) && day.Date <= Yesterday.PlusDays(-14) ? day with { Plan = DayPlan.None with { Absence = AbsenceWord.Ill } } : day);

        Assert.Equal(new UsualWeeks(350, 350, 8), Of([.. away]).Usual);
    }

    [Fact]
    public void TheWordsSayWhatIsUnknown()
    {
        var picture = Of(Trends("a", 30, back => back < 3 ? null : 40, back => back < 5 ? null : false));

        Assert.Equal(
            "56 days to 28 Feb. The last 7 days: 160 AU so far, 4 of 7 days known; a usual week: not known yet. Load on 27 days, the highest 40 AU on 25 Feb; none on 0; unknown on 29. "
            + "Heavy or fast leg work on 0 days; unknown on 31.",
            picture.Words);
    }

    [Fact]
    public void ASessionWithoutALoadIsToldApartFromAnUnknownDay()
    {
        var days = QuietDays("a", 60).Select(day => day.Date == Yesterday ? day with { Load = null, State = DayState.Recorded } : day);

        Assert.Contains("; none on 14; trained without a load that could be computed on 1.", Of([.. days]).Words, StringComparison.Ordinal);
    }

    [Fact]
    public void OnlyTheFlaggedHaveOne()
    {
        var brief = SquadBrief();

        Assert.All(brief.Flagged, person => Assert.NotNull(person.Picture));
        Assert.All(brief.Flagged, person => Assert.Equal(brief.DataUpTo, person.Picture!.Last));
    }

    [Theory]
    [InlineData(NamesShown.Full)]
    [InlineData(NamesShown.Initials)]
    public void TheWordsNameNobody(NamesShown shown)
    {
        var people = new[] { Person("ann", "Ann Tarrow") };
        var brief = BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("ann", "Ann Tarrow", LoadRatio("ann"))], []);

        Assert.DoesNotContain("Ann", MailNames.Of(brief, shown, people).Flagged[0].Picture!.Words, StringComparison.Ordinal);
    }

    private static PersonPicture Of(IReadOnlyList<Day> days)
    {
        var subject = Subject("a", "Ann", LoadRatio("a")) with { Days = days };
        return BriefBuilder.Build(Contact(ContactRole.Coach), Today, [subject], []).Flagged[0].Picture!;
    }
}
