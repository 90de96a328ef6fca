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
    [Fact]
    public void TheStorylineHoldsForEverySeed()
    {
        var mornings = Enumerable.Range(0, 20).Select(seed => (Seed: seed, Until: new LocalDate(2026, 11, 29).PlusDays(seed)));
        Assert.All(mornings, morning => Assert.Equal(DemoStory.Alerts, Standing(morning.Seed, morning.Until)));
    }

    /// <summary>Europe/Helsinki: 25 October 2026, 4:00 to 3:00; 28 March 2027, 3:00 to 4:00 (tz database).</summary>
    [Theory]
    [InlineData(2026, 10, 26)]
    [InlineData(2027, 3, 29)]
    public void TheStorylineHoldsAcrossAChangeOfTheClock(int year, int month, int day) =>
        Assert.Equal(DemoStory.Alerts, Standing(seed: 1, new LocalDate(year, month, day)));

    [Fact]
    public void ARampIsMoreThanTwiceTheUsualWeek()
    {
        var until = new LocalDate(2026, 12, 1);
        var ramps = DemoCast.All.Where(part => part.Plot == DemoPlot.RampUp).ToList();
        Assert.Equal(2, ramps.Count);
        Assert.All(ramps, part => Assert.InRange(Days(part, 7, until)[^1].RatioUncoupled!.Value, 2.0, 2.8));
    }

    private static List<DemoAlert> Standing(int seed, LocalDate until) => DemoCast.All
        .AsParallel()
        .SelectMany(part => Findings(part, seed, until))
        .Select(finding => new DemoAlert(finding.Person, finding.Rule, finding.Region, finding.Severity))
        .OrderBy(alert => alert.Person, StringComparer.Ordinal)
        .ToList();

    private static IEnumerable<Finding> Findings(DemoPart part, int seed, LocalDate until) =>
        RuleBook.Evaluate(DemoPerson.Draw(part, seed, until).Person, Days(part, seed, until), new RuleLimits())
            .Where(finding => finding.Date == until.PlusDays(-1));

    private static IReadOnlyList<Day> Days(DemoPart part, int seed, LocalDate until)
    {
        var person = DemoPerson.Draw(part, seed, until);
        var anchors = new AnchorBook(person.Anchors);
        var activities = DemoSessions.Of(person, seed, until).Select(activity => OnDay(person, anchors, DemoRecording.Of(activity))).ToList();
        return LoadCalendar.Build(part.Id, activities, until.PlusDays(-1));
    }

    private static ActivityOnDay OnDay(DemoPerson person, AnchorBook anchors, Recordings.Recording recording)
    {
        var values = ActivityComputation.Compute(recording, person.Person, anchors, new ComputationSettings());
        var load = values.Quantities.SingleOrDefault(quantity => quantity.Name == QuantityNames.BanisterTrimp)?.Value;
        var start = LocalStart.Of(recording, person.Person);
        return new ActivityOnDay(start.ToInstant().ToString(), start.Date, ["device"], load, values.Stimulus);
    }
}
