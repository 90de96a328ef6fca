using LoadWatch.Days;
using LoadWatch.Findings;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Planned;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Findings;

/// <summary>Before the days in question lie 60 with strains of 100 to 159: the 90 % quantile is the 54th of them, 153.</summary>
public class MonotonyRuleTests
{
    private static readonly MonotonyRule Rule = new();

    [Theory]
    [InlineData(2.01, 200, true)]
    [InlineData(2, 200, false)]
    [InlineData(2.01, 100, false)]
    [InlineData(2.01, 100.1, true)]
    public void TheLimitAndTheUsualMustBeExceeded(double monotony, double acute, bool raised) =>
        Assert.Equal(raised, Rule.Of([.. History(60), Week(60, monotony, acute)]).Count == 1);

    [Theory]
    [InlineData(153, false)]
    [InlineData(153.001, true)]
    public void TheStrainMustExceedTheOwnQuantile(double strain, bool raised) =>
        Assert.Equal(raised, Rule.Of([.. History(60), Week(60, 3, 200) with { Strain = strain }]).Count == 1);

    [Fact]
    public void FewerThanSixtyStrainsSayNothing() => Assert.Empty(Rule.Of([.. History(59), Week(59, 3, 200)]));

    /// <summary>The strains of 30 to 59 are 130 to 159 and 30 more of 10: with the first 30 gone the quantile is still known, with 31 gone it is not.</summary>
    [Theory]
    [InlineData(90, 1)]
    [InlineData(91, 0)]
    public void StrainsOlderThanTheLookBackDoNotCount(int day, int count)
    {
        var limits = Stated with { Monotony = Stated.Monotony with { LookBackDays = 60 } };
        var later = Enumerable.Range(60, 30).Select(at => Week(at, 1, 10));

        Assert.Equal(count, Rule.Of([.. History(60), .. later, .. Enumerable.Range(90, day - 90).Select(Unknown), Week(day, 3, 200)], limits: limits).Count);
    }

    [Fact]
    public void ItHoldsUntilBelowTheReturnValueOrUntilTheWeekIsNoHeavierThanUsual()
    {
        var found = Rule.Of([.. History(60), Week(60, 2.5, 200), Week(61, 1.8, 200), Week(62, 1.79, 200), Week(63, 2.5, 200), Week(64, 2.5, 100)]);

        Assert.Equal([On(60), On(61), On(63)], found.Select(finding => finding.Date));
        Assert.Equal([On(60), On(60), On(63)], found.Select(finding => finding.Since));
        Assert.All(found, finding => Assert.Equal((Severity.Notice, 2.0, "ratio"), (finding.Severity, finding.Limit, finding.Unit)));
    }

    [Fact]
    public void AnUnknownStretchNeitherRaisesNorClears()
    {
        Assert.Empty(Rule.Of([.. History(60), Unknown(60), Unknown(61)]));
        Assert.Equal(3, Rule.Of([.. History(60), Week(60, 2.5, 200), Unknown(61), Unknown(62)]).Count);
    }

    [Fact]
    public void SaysWhatItIs()
    {
        var found = Rule.Of([.. History(60), Week(60, 2.5, 200), Week(61, 1.9, 200), Unknown(62)]);

        Assert.Equal(
            "Load of the last 7 days varies little at more than the usual week (monotony 2.5, 200 against 100 AU); the limit is 2.0, passed since 6 March.", found[0].Text);
        Assert.Equal(
            "Load of the last 7 days varied little at more than the usual week (monotony 1.9, 200 against 100 AU) on 7 March, not known since; "
                + "it passed the limit of 2.0 on 6 March and returns below 1.8.",
            found[^1].Text);
    }

    /// <summary>
    /// Twelve weeks of five days of 100 and two of rest: monotony 1.46, strain 732. Then a week of 110, 120, 110, 120, 110, 120, 110: mean 114.29, standard
    /// deviation (n - 1) 5.345, monotony 21.38, load 800 against 500.
    /// </summary>
    [Fact]
    public void FromActivitiesToTheFinding()
    {
        var weeks = Enumerable.Range(0, 84).Select(day => day % 7 < 5 ? 100.0 : 0);
        var found = Rule.Of(DaysOf([.. weeks, 110, 120, 110, 120, 110, 120, 110]));

        Assert.Equal(On(90), found[^1].Date);
        Near(21.3809, found[^1].Value, 1e-5);
    }

    private static IEnumerable<Day> History(int days) => Enumerable.Range(0, days).Select(day => Week(day, 1, 100 + day));

    private static Day Week(int day, double monotony, double acute) => Watched.Ratio(day, 1) with
    {
        Monotony = monotony,
        Acute = acute,
        ChronicBefore = 100,
        Strain = monotony * acute,
    };

    private static Day Unknown(int day) => Watched.Ratio(day, null);
}
