using LoadWatch.Days;
using LoadWatch.Plans;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

/// <summary>Monotony and strain after Foster 1998, Med Sci Sports Exerc 30:1164-1168, with n - 1.</summary>
public class LoadSpreadTests
{
    /// <summary>Hand calculation.</summary>
    [Theory]
    [InlineData(new double[] { 300, 0, 450, 200, 0, 600, 150 }, 1.082232, 1839.794)]
    [InlineData(new double[] { 245, 240, 250, 240, 245, 240, 240 }, 61.73321, 104946.5)]
    [InlineData(new double[] { 400, 400, 400, 400, 400, 0, 0 }, 1.463850, 2927.700)]
    [InlineData(new double[] { 120, 0, 120, 0, 120, 0, 0 }, 0.801784, 288.6421)]
    public void MonotonyAndStrainOfAWeek(double[] loads, double monotony, double strain)
    {
        var day = Daily(loads)[^1];

        Near(monotony, day.Monotony, 1e-6);
        Near(strain, day.Strain, 1e-6);
    }

    /// <summary>Hand calculation, the same weeks over n; the third and fourth are the root of 5/2 and of 3/4.</summary>
    [Theory]
    [InlineData(new double[] { 300, 0, 450, 200, 0, 600, 150 }, 1.168944, 1987.205)]
    [InlineData(new double[] { 245, 240, 250, 240, 245, 240, 240 }, 66.67949, 113355.1)]
    [InlineData(new double[] { 400, 400, 400, 400, 400, 0, 0 }, 1.581139, 3162.278)]
    [InlineData(new double[] { 120, 0, 120, 0, 120, 0, 0 }, 0.866025, 311.7691)]
    public void OverNTheyAreLarger(double[] loads, double monotony, double strain)
    {
        var day = LoadCalendar.Continue("anna", [], [.. loads.Select((load, at) => Activity(at, load))], On(loads.Length - 1), PersonPlan.None, LoadDeviation.Population)[^1];

        Near(monotony, day.Monotony, 1e-6);
        Near(strain, day.Strain, 1e-6);
    }

    /// <summary>Closed form: k equal days give sqrt(k / (7 - k)) with the deviation over n; over n - 1 it is smaller by sqrt(6 / 7).</summary>
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(5)]
    [InlineData(6)]
    public void EqualTrainingDaysHaveAMonotonyOfTheirNumberAlone(int trained)
    {
        foreach (var load in new[] { 1.0, 37.3, 400 })
        {
            var day = Daily([.. Enumerable.Repeat(load, trained), .. Enumerable.Repeat(0.0, 7 - trained)])[^1];

            Near(Math.Sqrt(trained / (7.0 - trained)) * Math.Sqrt(6 / 7.0), day.Monotony, 1e-8);
        }
    }

    [Theory]
    [InlineData(0)]
    [InlineData(0.1)]
    [InlineData(400)]
    public void EqualLoadsHaveNoMonotony(double load)
    {
        var day = Daily([.. Enumerable.Repeat(load, 7)])[^1];

        Assert.Null(day.Monotony);
        Assert.Null(day.Strain);
    }

    [Fact]
    public void AnUnknownDayLeavesMonotonyUnknown()
    {
        Assert.Null(Daily([300, null, 450, 200, 0, 600, 150])[^1].Monotony);
        Assert.Null(Daily(300, 0, 450, 200, 0, 600)[^1].Monotony);
    }
}
