using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.Service.Demo;
using NodaTime;

namespace LoadWatch.Service.Tests.Demo;

public class DemoStoryTests
{
    /// <summary>Of the limit of 2.2, so that no seed comes near it by chance.</summary>
    private const double RatioOfUsualPeople = 1.7;

    /// <summary>
    /// Mornings on which a change of the clock lies a day back. Europe/Helsinki: 25 October 2026, 4:00 to 3:00; 28 March 2027, 3:00 to 4:00 (tz database).
    /// </summary>
    private static readonly LocalDate[] AfterChangesOfTheClock = [new(2026, 10, 26), new(2027, 3, 29)];

    /// <summary>Seeds and weekdays together: every weekday comes up, and both changes of the clock.</summary>
    [Fact]
    public void TheStorylineHoldsForEverySeedWeekdayAndChangeOfTheClock()
    {
        var mornings = Enumerable.Range(0, 7).Select(day => new LocalDate(2026, 11, 29).PlusDays(day)).Concat(AfterChangesOfTheClock);
        Assert.All(mornings.Select((until, seed) => (Seed: seed, Until: until)), morning => AssertStory(morning.Seed, morning.Until));
    }

    private static void AssertStory(int seed, LocalDate until)
    {
        var ends = new DemoLife(seed, until).Ends.ToList();
        var alerts = ends.SelectMany(end => end.Alerts).OrderBy(alert => alert.Person, StringComparer.Ordinal).ThenBy(alert => alert.Rule, StringComparer.Ordinal);
        Assert.Equal(string.Join('\n', DemoStory.Alerts), string.Join('\n', alerts.Except(DemoStory.Possible)));
        Assert.All(ends.Where(end => end.Part.Plot == DemoPlot.RampUp), end => Assert.InRange(end.Day.RatioUncoupled!.Value, 2.4, 3.5));
        Assert.All(ends.Where(end => end.Part.Plot == DemoPlot.Usual), end => Assert.InRange(end.Day.RatioUncoupled ?? 1, 0.6, RatioOfUsualPeople));
        Assert.All(ends.Where(end => end.Part.Plot == DemoPlot.StrapFailed), end => Assert.Null(end.Day.Chronic));
        AssertTables(ends);
    }

    /// <summary>Sets are readable to the full, every rated recording has its rating, and two ratings are asked about.</summary>
    private static void AssertTables(IReadOnlyList<DemoEnd> ends)
    {
        var classes = ends.Where(end => end.Part.Group == DemoCast.Class).SelectMany(end => end.Training.Activities).ToList();
        Assert.All(classes, session => Assert.NotNull(session[QuantityNames.Sets]));
        Assert.All(classes.SelectMany(session => session.Stimulus), region => Assert.NotNull(region.HardRepetitions ?? region.HardBouts));
        Assert.All(ends, end => Assert.Empty(end.Training.UnknownExercises));

        var questions = ends.SelectMany(end => end.Training.Questions.Select(question => $"{end.Part.Id}: {question.Sentence}")).ToList();
        Assert.Collection(
            questions,
            question => Assert.StartsWith("eero: a rating of 6 of ", question, StringComparison.Ordinal),
            question => Assert.StartsWith("helmi: a rating of 4 of ", question, StringComparison.Ordinal));

        var rows = ends.Where(end => end.Part.Group == DemoCast.Boat).SelectMany(end => end.Training.Activities).ToList();
        Assert.Equal(rows.Count - 2, rows.Count(session => session[QuantityNames.FosterLoad] is > 0));
        Assert.Equal(rows.Count, rows.Count(session => session.UsableShare.Count > 0));
    }
}
