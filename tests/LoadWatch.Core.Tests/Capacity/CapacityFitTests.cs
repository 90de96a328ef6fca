using CsCheck;

namespace LoadWatch.Capacity;

public class CapacityFitTests
{
    /// <summary>To the printed digits; the source is named with the trials.</summary>
    [Theory]
    [InlineData(1, 217.198, 11910.4, 4.63, 1261.7, 0.99864)]
    [InlineData(2, 290.566, 19417.4, 6.15, 1896.1, 0.99866)]
    [InlineData(3, 236.254, 11383.9, 1.15, 503.1, 0.99995)]
    [InlineData(4, 201.492, 15727.8, 2.65, 1199.0, 0.99948)]
    [InlineData(5, 173.629, 14510.5, 3.00, 773.8, 0.99910)]
    public void WorkOnTimeGivesThePublishedValues(int person, double watts, double joules, double wattsError, double joulesError, double rSquared) =>
        Assert.Equal((watts, joules, wattsError, joulesError, rSquared), Printed(WorkTimeFit.Of(PublishedTrials.Of(person))!));

    /// <inheritdoc cref="WorkOnTimeGivesThePublishedValues"/>
    [Theory]
    [InlineData(1, 210.961, 13239.8, 6.52, 1156.0, 0.97764)]
    [InlineData(2, 291.716, 19143.1, 7.03, 1526.7, 0.98128)]
    [InlineData(3, 237.962, 10819.7, 1.57, 393.3, 0.99736)]
    [InlineData(4, 198.563, 16790.1, 3.57, 1054.5, 0.98830)]
    [InlineData(5, 173.816, 14468.9, 2.68, 553.9, 0.99562)]
    public void PowerOnInverseTimeGivesThePublishedValues(int person, double watts, double joules, double wattsError, double joulesError, double rSquared) =>
        Assert.Equal((watts, joules, wattsError, joulesError, rSquared), Printed(InverseTimeFit.Of(PublishedTrials.Of(person))!));

    /// <inheritdoc cref="WorkOnTimeGivesThePublishedValues"/>
    [Theory]
    [InlineData(1, 221.007, 10479.7)]
    [InlineData(2, 291.033, 19098.2)]
    [InlineData(3, 235.153, 11963.9)]
    [InlineData(4, 204.066, 14268.9)]
    [InlineData(5, 173.295, 14582.2)]
    public void LeastSquaresInTimeGiveThePublishedValues(int person, double watts, double joules)
    {
        var fit = TimeFit.Of(PublishedTrials.Of(person))!;

        Assert.Equal((watts, joules), (Math.Round(fit.Critical, 3), Math.Round(fit.Reserve, 1)));
        Assert.True(fit is { CriticalError: > 0, ReserveError: > 0 });
    }

    /// <summary>To the printed digits; P_max by hand: 232.266 + 14841.6 / 44.004 = 569.55 W.</summary>
    [Fact]
    public void TheThirdParameterOfTheThirdPersonIsAsPublished()
    {
        var fit = ThreeParameterFit.Of(PublishedTrials.Of(3))!;

        Assert.Equal((232.266, 14841.6, -44.004), (Math.Round(fit.Fit.Critical, 3), Math.Round(fit.Fit.Reserve, 1), Math.Round(fit.AsymptoteSeconds, 3)));
        Assert.Equal(569.55, fit.Maximum, 2);
        Assert.Equal((0.2692, 265.487, 3.7128), (Math.Round(fit.Fit.CriticalError!.Value, 4), Math.Round(fit.Fit.ReserveError!.Value, 3), Math.Round(fit.AsymptoteError!.Value, 4)));
    }

    /// <summary>
    /// By an independent computation with P_max as the third parameter itself, t = W' / (P - CP) - W' / (P_max - CP): 22.8859 W, which the delta method has to meet; without the
    /// covariances it would be 29.09 W.
    /// </summary>
    [Fact]
    public void TheHighestPowerIsAsSureAsWhereItIsAParameterItself()
    {
        var fit = ThreeParameterFit.Of(PublishedTrials.Of(3))!;

        Assert.Equal(22.8859, fit.MaximumError!.Value, 4);
    }

    [Fact]
    public void AsManyTrialsAsParametersLeaveNothingOverForAnError()
    {
        var (critical, reserve, maximum) = (250.0, 18_000.0, 900.0);
        var fit = ThreeParameterFit.Of([.. new[] { 275.0, 310, 400 }.Select(watts => Trial.OfMean((reserve / (watts - critical)) - (reserve / (maximum - critical)), watts))]);

        Assert.True(fit is null or { MaximumError: null, AsymptoteError: null, Fit: { CriticalError: null, ReserveError: null } });
    }

    /// <summary>By hand: on the line of two parameters k is 0 but for rounding, and P_max would be without end.</summary>
    [Fact]
    public void OnTheLineOfTwoParametersThereIsNoThird() => Assert.Null(ThreeParameterFit.Of([Trial.OfMean(120, 400), Trial.OfMean(300, 310), Trial.OfMean(720, 275)]));

    [Fact]
    public void AllRegressionsOfTheSameTrialsAreThoseOfEachAlone()
    {
        var trials = PublishedTrials.Of(3);
        var all = TrialRegressions.Of(trials);

        Assert.Equal((WorkTimeFit.Of(trials), InverseTimeFit.Of(trials), TimeFit.Of(trials), ThreeParameterFit.Of(trials)), (all.WorkTime, all.InverseTime, all.Time, all.ThreeParameter));
        Assert.Equal(4, all.All.Count);
        Assert.Equal(3, TrialRegressions.Of(PublishedTrials.Of(1)).All.Count);
        Assert.Empty(TrialRegressions.Of([]).All);
    }

    /// <summary>The same source: with the others the third parameter degenerates.</summary>
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(4)]
    [InlineData(5)]
    public void WhereTheThirdParameterDegeneratesThereIsNone(int person) => Assert.Null(ThreeParameterFit.Of(PublishedTrials.Of(person)));

    /// <summary>
    /// World records as remembered, 1500 to 10 000 m and without the last; the figures are those of an independent computation: d = D' + CS t.
    /// </summary>
    [Fact]
    public void DistanceOnTimeGivesCriticalSpeed()
    {
        Trial[] records = [new(211.76, 1500), new(445.09, 3000), new(759.36, 5000), new(1582.75, 10_000)];

        Assert.Equal((6.1857, 237.3), Rounded(WorkTimeFit.Of(records)!));
        Assert.Equal((6.3900, 150.1), Rounded(WorkTimeFit.Of(records[..3])!));
    }

    [Fact]
    public void EveryFitFindsWhatTrialsWereMadeFrom() => Gen.Select(Gen.Double[50, 500], Gen.Double[3000, 40_000], Gen.Double[90, 300].Array[3, 8]).Sample((critical, reserve, steps) =>
    {
        var seconds = steps.Select((_, at) => steps[..(at + 1)].Sum());
        Trial[] trials = [.. seconds.Select(time => new Trial(time, reserve + (critical * time)))];

        foreach (var fit in new[] { WorkTimeFit.Of(trials), InverseTimeFit.Of(trials), TimeFit.Of(trials) })
        {
            Assert.Equal(critical, fit!.Critical, critical * 1e-6);
            Assert.Equal(reserve, fit.Reserve, reserve * 1e-5);
            Assert.True(fit.CriticalError >= 0 && fit.CriticalError < critical * 1e-5);
        }
    });

    [Fact]
    public void TheThreeParametersAreFoundToo() =>
        Gen.Select(Gen.Double[100, 400], Gen.Double[8000, 30_000], Gen.Double[2.2, 5]).Sample((critical, reserve, times) =>
        {
            var maximum = critical * times;
            Trial[] trials = [.. new[] { 1.08, 1.15, 1.25, 1.4, 1.6 }.Select(share => Trial.OfMean((reserve / ((share - 1) * critical)) - (reserve / (maximum - critical)), share * critical))];
            var fit = ThreeParameterFit.Of([.. trials.Where(trial => trial.Seconds > 0)]);

            Assert.Equal(critical, fit!.Fit.Critical, critical * 1e-5);
            Assert.Equal(reserve, fit.Fit.Reserve, reserve * 1e-4);
            Assert.Equal(maximum, fit.Maximum, maximum * 1e-3);
        });

    [Fact]
    public void TheOrderOfTrialsChangesNothing()
    {
        var trials = PublishedTrials.Of(1);

        Assert.Equal(Printed(WorkTimeFit.Of(trials)!), Printed(WorkTimeFit.Of([.. trials.Reverse()])!));
        Assert.Equal(TimeFit.Of(trials)!.Critical, TimeFit.Of([.. trials.Reverse()])!.Critical, 9);
    }

    [Fact]
    public void WhatIsNoTrialGivesNoFit()
    {
        foreach (var fit in new Func<IReadOnlyCollection<Trial>, CapacityFit?>[] { WorkTimeFit.Of, InverseTimeFit.Of, TimeFit.Of })
        {
            Assert.Null(fit([]));
            Assert.Null(fit([new(100, 20_000)]));
            Assert.Null(fit([new(100, 20_000), new(100, 21_000)]));
            Assert.Null(fit([new(100, 20_000), new(0, 21_000)]));
            Assert.Null(fit([new(100, 20_000), new(200, double.NaN)]));
        }

        Assert.Null(ThreeParameterFit.Of([new(100, 30_000), new(200, 55_000)]));
    }

    private static (double, double) Rounded(CapacityFit fit) => (Math.Round(fit.Critical, 4), Math.Round(fit.Reserve, 1));

    private static (double, double, double, double, double) Printed(CapacityFit fit) => (
        Math.Round(fit.Critical, 3), Math.Round(fit.Reserve, 1), Math.Round(fit.CriticalError!.Value, 2), Math.Round(fit.ReserveError!.Value, 1), Math.Round(fit.RSquared!.Value, 5));
}
