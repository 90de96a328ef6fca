using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Recordings;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

public class NotUsableRuleTests
{
    [Fact]
    public void TwoSessionsInSevenDaysAreToldUntilAWeekIsWithout()
    {
        var findings = Evaluate((2, Channel.HeartRate, 0.3), (7, Channel.HeartRate, 0.49));

        Assert.Equal((On(7), On(13), 7), (findings[0].Date, findings[^1].Date, findings.Count));
        Assert.Equal("Too little usable heart rate in 2 sessions of the last 7 days, last on 12 January: nothing was read from it.", findings[0].Text);
        Assert.Equal("Too little usable heart rate in 1 session of the last 7 days, last on 12 January: nothing was read from it; over with 0 or fewer.", findings[^1].Text);
    }

    [Fact]
    public void OneSessionOrTwoFarApartAreNot()
    {
        Assert.Empty(Evaluate((2, Channel.HeartRate, 0.3)));
        Assert.Empty(Evaluate((2, Channel.HeartRate, 0.3), (9, Channel.HeartRate, 0.3)));
    }

    [Fact]
    public void HalfUsableIsEnough() => Assert.Empty(Evaluate((2, Channel.HeartRate, 0.5), (3, Channel.HeartRate, 0.5)));

    [Fact]
    public void ASpeedThatDropsOutIsNoMatter() => Assert.Empty(Evaluate((2, Channel.Speed, 0.1), (3, Channel.Speed, 0.1)));

    [Fact]
    public void HeartRateThatIsNotUsedForThePersonIsNotMissed() =>
        Assert.Empty(Evaluate([(2, Channel.HeartRate, 0.3), (3, Channel.HeartRate, 0.3)], from: 0));

    [Fact]
    public void OneSessionCountsOnceHoweverManyChannels() => Assert.Empty(
        Evaluate([], -1, new JoinedActivity
        {
            Key = "a",
            Date = On(3),
            Sport = Sport.Generic,
            Sources = ["watch"],
            UsableShare = new Dictionary<Channel, double> { [Channel.HeartRate] = 0.1, [Channel.Power] = 0.2 },
        }));

    private static List<Finding> Evaluate(params (int Day, Channel Channel, double Share)[] sessions) => Evaluate(sessions, from: -1);

    private static List<Finding> Evaluate((int Day, Channel Channel, double Share)[] sessions, int from, params JoinedActivity[] more)
    {
        var activities = sessions.Select(session => new JoinedActivity
        {
            Key = $"a{session.Day}",
            Date = On(session.Day),
            Sport = Sport.Generic,
            Sources = ["watch"],
            UsableShare = new Dictionary<Channel, double> { [session.Channel] = session.Share },
        });
        var days = Enumerable.Range(0, 20).Select(day => new Day { Person = "anna", Date = On(day), State = DayState.Recorded }).ToList();
        var person = from < 0 ? Anna : Anna with { HeartRateInvalid = LoadWatch.People.DatePeriods.Since(On(from)) };
        return new NotUsableRule().Evaluate(new RuleSubject(person, days, Watched.Stated) { Activities = [.. activities, .. more] }).ToList();
    }
}
