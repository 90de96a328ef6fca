using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

public class StimulusLowRuleTests
{
    private static readonly StimulusLowRule Rule = new();

    [Fact]
    public void AMemberSeenOnTuesdaysAndThursdaysRaisesNothingForTwelveWeeks() =>
        Assert.Empty(Rule.Of(Visits(84), birthYear: 1950));

    [Fact]
    public void OneMissedVisitRaisesNothing() =>
        Assert.Empty(Rule.Of(Visits(100, missed: [73]), birthYear: 1950));

    [Fact]
    public void FromSixtyTwoHeavyDaysInFourteenAreTooFew()
    {
        var days = Visits(100, missed: [73, 78]);

        var findings = Rule.Of(days, birthYear: 1950);
        Assert.Equal((On(80), 2, 3), (findings[0].Date, findings[0].Value, findings[0].Limit));
        Assert.Equal("Heavy or fast leg work on 2 days of 14; usually 4, the limit is 3. So since 26 March.", findings[0].Text);
        Assert.Equal(BodyRegion.Legs, findings[0].Region);
    }

    [Fact]
    public void ItEndsWhenOneDayMoreThanTheLimitLiesInTheFourteen() =>
        Assert.Equal(On(91), Rule.Of(Visits(100, missed: [73, 78]), birthYear: 1950)[^1].Date);

    [Fact]
    public void UnderSixtyTheSameIsEnough() => Assert.Empty(Rule.Of(Visits(100, missed: [73, 78])));

    [Fact]
    public void UnderHalfOfTheUsualIsTooFewWhateverTheFloor()
    {
        var days = Heavy(100, day => day < 80 ? day % 2 == 0 : day % 5 == 0);

        Assert.Equal((On(94), 2, 3.5), Rule.Of(days) is [var first, ..] ? (first.Date, first.Value, first.Limit) : default);
    }

    [Fact]
    public void InTheFirstEightWeeksItIsOff() => Assert.Empty(Rule.Of(Heavy(55, day => day % 9 == 0), birthYear: 1950));

    [Fact]
    public void WhileTheGapIsToldByItsOwnRuleItIsNotRaised() =>
        Assert.DoesNotContain(Rule.Of(Heavy(90, day => day <= 60 && day % 3 == 0), birthYear: 1990), finding => finding.Since >= On(70));

    /// <summary>A gap that nobody watches tells nothing.</summary>
    [Fact]
    public void WhereTheGapIsNotWatchedItIsRaisedInItsPlace()
    {
        var days = Heavy(90, day => day <= 60 && day % 3 == 0);
        var limits = Watched.Stated with { StimulusGap = Watched.Stated.StimulusGap with { Enabled = false } };

        Assert.Contains(Rule.Of(days, limits: limits), finding => finding.Since >= On(70));
    }

    /// <summary>Low from the date 78 on, and enough again on 87.</summary>
    [Fact]
    public void TheDelaysAreLimits()
    {
        var days = Visits(100, missed: [73, 78]);
        var slow = Watched.Stated with { StimulusLow = Watched.Stated.StimulusLow with { OnDays = 7 } };

        Assert.Equal(On(84), Rule.Of(days, birthYear: 1950, limits: slow)[0].Date);
        Assert.Equal(On(86), Rule.Of(days, birthYear: 1950, limits: Watched.Stated with { StimulusLow = Watched.Stated.StimulusLow with { ReturnExtraDays = 0 } })[^1].Date);
        Assert.Equal(On(87), Rule.Of(days, birthYear: 1950, limits: Watched.Stated with { StimulusLow = Watched.Stated.StimulusLow with { ReturnExtraDays = 0, OffDays = 2 } })[^1].Date);
    }

    [Theory]
    [InlineData(PlanWord.LightWeek)]
    [InlineData(PlanWord.OffSeason)]
    public void InPhasesOfLessItIsOff(PlanWord phase)
    {
        var days = Visits(100, missed: [73, 78]).Select(day => day.Date >= On(78) ? day with { Plan = DayPlan.None with { Phases = [phase] } } : day).ToList();

        Assert.Empty(Rule.Of(days, birthYear: 1950));
    }

    [Fact]
    public void AnUnknownTailNeitherRaisesNorClears()
    {
        var standing = Visits(100, missed: [73, 78]).Take(85).ToList();
        var tail = Enumerable.Range(85, 10).Select(day => Unknown(day));

        Assert.Equal(On(94), Rule.Of([.. standing, .. tail], birthYear: 1950)[^1].Date);
        Assert.Empty(Rule.Of([.. Visits(80), .. Enumerable.Range(80, 9).Select(day => Unknown(day))], birthYear: 1950));
    }

    /// <summary>Heavy on the second and fourth day of each week, rest on the others.</summary>
    private static List<Day> Visits(int days, int[]? missed = null) => Heavy(days, day => day % 7 is 1 or 3 && missed?.Contains(day) is not true);

    private static List<Day> Heavy(int days, Func<int, bool> heavy)
    {
        var last = 0;
        return Enumerable.Range(0, days).Select(day =>
        {
            last = heavy(day) ? day : last;
            return Of(day, heavy(day), day - last);
        }).ToList();
    }

    private static Day Of(int day, bool? heavy, int since) => new()
    {
        Person = "anna",
        Date = On(day),
        State = heavy is null ? DayState.Unknown : DayState.Recorded,
        Regions = new Dictionary<BodyRegion, RegionDay> { [BodyRegion.Legs] = new(heavy, 0, 0, since, since, null) },
    };

    private static Day Unknown(int day) => Of(day, null, 1);
}
