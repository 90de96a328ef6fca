using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Service.Demo;
using NodaTime;

namespace LoadWatch.Service.Tests.Demo;

public class DemoStoryTests
{
    /// <summary>Of the limit of 1.8, so that no seed comes near it by chance.</summary>
    private const double RatioOfUsualPeople = 1.7;

    /// <summary>Seeds and weekdays together: every weekday comes up.</summary>
    [Fact]
    public void TheStorylineHoldsForEverySeed()
    {
        var mornings = Enumerable.Range(0, 20).Select(seed => (Seed: seed, Until: new LocalDate(2026, 11, 29).PlusDays(seed)));
        Assert.All(mornings, morning => AssertStory(morning.Seed, morning.Until));
    }

    /// <summary>Europe/Helsinki: 25 October 2026, 4:00 to 3:00; 28 March 2027, 3:00 to 4:00 (tz database).</summary>
    [Theory]
    [InlineData(2026, 10, 26)]
    [InlineData(2027, 3, 29)]
    public void TheStorylineHoldsAcrossAChangeOfTheClock(int year, int month, int day) => AssertStory(seed: 1, new LocalDate(year, month, day));

    private static void AssertStory(int seed, LocalDate until)
    {
        var ends = DemoCast.All.AsParallel().AsOrdered().Select(part => End.Of(part, seed, until)).ToList();
        Assert.Equal(DemoStory.Alerts, ends.SelectMany(end => end.Alerts).OrderBy(alert => alert.Person, StringComparer.Ordinal));
        Assert.All(ends.Where(end => end.Part.Plot == DemoPlot.RampUp), end => Assert.InRange(end.Day.RatioUncoupled!.Value, 2.0, 2.8));
        Assert.All(ends.Where(end => end.Part.Plot == DemoPlot.Usual), end => Assert.InRange(end.Day.RatioUncoupled ?? 1, 0.6, RatioOfUsualPeople));
        Assert.All(ends.Where(end => end.Part.Plot == DemoPlot.StrapFailed), end => Assert.Null(end.Day.Chronic));
    }

    /// <summary>The last date of one person.</summary>
    private sealed record End(DemoPart Part, Day Day, IReadOnlyList<DemoAlert> Alerts)
    {
        public static End Of(DemoPart part, int seed, LocalDate until)
        {
            var person = DemoPerson.Draw(part, seed, until);
            var days = Days(person, seed, until);
            var alerts = RuleBook.Evaluate(new RuleSubject(person.Person, days, new RuleLimits()))
                .Where(finding => finding.Date == until.PlusDays(-1))
                .Select(finding => new DemoAlert(finding.Person, finding.Rule, finding.Region, finding.Severity));
            return new End(part, days[^1], [.. alerts]);
        }
    }

    private static IReadOnlyList<Day> Days(DemoPerson person, int seed, LocalDate until)
    {
        var anchors = new AnchorBook(person.Anchors);
        var activities = DemoSessions.Of(person, seed, until).Select(activity => OnDay(person, anchors, DemoRecording.Of(activity))).ToList();
        return LoadCalendar.Build(person.Part.Id, activities, until.PlusDays(-1));
    }

    private static ActivityOnDay OnDay(DemoPerson person, AnchorBook anchors, Recordings.Recording recording)
    {
        var values = ActivityComputation.Compute(recording, person.Person, anchors, new ComputationSettings());
        var load = values.Quantities.SingleOrDefault(quantity => quantity.Name == QuantityNames.BanisterTrimp)?.Value;
        var start = LocalStart.Of(recording, person.Person);
        return new ActivityOnDay(start.ToInstant().ToString(), start.Date, ["device"], load, values.Stimulus);
    }
}
