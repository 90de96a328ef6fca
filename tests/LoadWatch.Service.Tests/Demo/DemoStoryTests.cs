using LoadWatch.Days;
using LoadWatch.Loads;
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
        var ends = new DemoLife(seed, until).Ends.ToList();
        var alerts = ends.SelectMany(end => end.Alerts).OrderBy(alert => alert.Person, StringComparer.Ordinal).ThenBy(alert => alert.Rule, StringComparer.Ordinal);
        Assert.Equal(string.Join('\n', DemoStory.Alerts), string.Join('\n', alerts));
        Assert.All(ends.Where(end => end.Part.Plot == DemoPlot.RampUp), end => Assert.InRange(end.Day.RatioUncoupled!.Value, 2.0, 2.8));
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
