using LoadWatch.Days;
using MathNet.Numerics.Statistics;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

/// <summary>Four weeks of people who train at random: a week correlates with the mean of the four it is one of by 1 / sqrt(4), and with those before it not at all.</summary>
public class SpuriousCorrelationTests
{
    private static readonly IReadOnlyList<Day> People = [.. Simulate(people: 4000)];

    /// <summary>r of the acute and the coupled chronic load.</summary>
    public static double Coupled { get; } = Correlation.Pearson(People.Select(day => day.Acute!.Value), People.Select(day => day.Chronic!.Value));

    [Fact]
    public void AWeekCorrelatesWithAMeanThatHoldsIt() => Assert.Equal(0.50, Coupled, 0.05);

    [Fact]
    public void AWeekDoesNotCorrelateWithTheWeeksBefore() =>
        Assert.Equal(0, Correlation.Pearson(People.Select(day => day.Acute!.Value), People.Select(day => day.ChronicBefore!.Value)), 0.05);

    private static IEnumerable<Day> Simulate(int people)
    {
        var random = new Random(20260102);
        for (var person = 0; person < people; person++)
        {
            yield return Daily([.. Enumerable.Range(0, 28).Select(_ => random.NextDouble() * 100)])[^1];
        }
    }
}
