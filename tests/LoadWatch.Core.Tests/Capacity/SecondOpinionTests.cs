using CsCheck;
using MathNet.Numerics;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.Optimization;

namespace LoadWatch.Capacity;

/// <summary>
/// MathNet.Numerics as a second opinion on the regressions of trials: its line and R2, its matrices for the errors, its Levenberg-Marquardt search for least squares in time.
/// </summary>
public class SecondOpinionTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(5)]
    public void LinesThroughPublishedTrialsAreThoseOfMathNet(int person)
    {
        var trials = PublishedTrials.Of(person);
        var (seconds, done, means) = (trials.Select(one => one.Seconds).ToArray(), trials.Select(one => one.Done).ToArray(), trials.Select(one => one.Mean).ToArray());
        var (work, power) = (WorkTimeFit.Of(trials)!, InverseTimeFit.Of(trials)!);

        AssertLine(seconds, done, (work.Reserve, work.ReserveError, work.Critical, work.CriticalError, work.RSquared));
        AssertLine([.. seconds.Select(one => 1 / one)], means, (power.Critical, power.CriticalError, power.Reserve, power.ReserveError, power.RSquared));
    }

    [Fact]
    public void AnyLineOfLeastSquaresIsThatOfMathNet() =>
        Gen.Select(Gen.Double[1, 500], Gen.Double[0, 100]).Array[3, 40].Where(pairs => pairs.Max(pair => pair.Item1) - pairs.Min(pair => pair.Item1) > 1).Sample(pairs =>
        {
            var x = pairs.Select(pair => pair.Item1).ToArray();
            var y = pairs.Select(pair => (2 * pair.Item1) + pair.Item2).ToArray();
            var line = LeastSquares.Of(x, y)!;

            AssertLine(x, y, (line.Intercept, line.InterceptError, line.Slope, line.SlopeError, line.RSquared));
        });

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(5)]
    public void LeastSquaresInTimeAreThoseOfMathNet(int person)
    {
        var trials = PublishedTrials.Of(person);
        var (found, errors) = Searched(trials, [200, 15_000], (parameters, watts) => parameters[1] / (watts - parameters[0]));
        var fit = TimeFit.Of(trials)!;

        AssertNear(found, 1e-6, fit.Critical, fit.Reserve);
        AssertNear(errors, 1e-4, fit.CriticalError!.Value, fit.ReserveError!.Value);
    }

    /// <summary>Once with k, and once with the highest power itself as the third parameter: its error is what the delta method has to meet.</summary>
    [Fact]
    public void TheThreeParametersAndTheirErrorsAreThoseOfMathNet()
    {
        var trials = PublishedTrials.Of(3);
        var fit = ThreeParameterFit.Of(trials)!;
        var (found, errors) = Searched(trials, [232, 14_800, -44], (parameters, watts) => (parameters[1] / (watts - parameters[0])) + parameters[2]);
        var (highest, errorsOfHighest) = Searched(
            trials, [232, 14_800, 570], (parameters, watts) => (parameters[1] / (watts - parameters[0])) - (parameters[1] / (parameters[2] - parameters[0])));

        AssertNear(found, 1e-5, fit.Fit.Critical, fit.Fit.Reserve, fit.AsymptoteSeconds);
        AssertNear(errors, 1e-3, fit.Fit.CriticalError!.Value, fit.Fit.ReserveError!.Value, fit.AsymptoteError!.Value);
        AssertNear(highest, 1e-5, fit.Fit.Critical, fit.Fit.Reserve, fit.Maximum);
        AssertNear(errorsOfHighest, 1e-3, fit.Fit.CriticalError.Value, fit.Fit.ReserveError.Value, fit.MaximumError!.Value);
    }

    private static void AssertLine(double[] x, double[] y, (double Intercept, double? InterceptError, double Slope, double? SlopeError, double? RSquared) ours)
    {
        var (intercept, slope) = Fit.Line(x, y);
        var modelled = x.Select(one => intercept + (slope * one)).ToArray();
        var design = Matrix<double>.Build.Dense(x.Length, 2, (row, column) => column == 0 ? 1 : x[row]);
        var spread = GoodnessOfFit.StandardError(modelled, y, 2);
        var covariance = design.TransposeThisAndMultiply(design).Inverse() * spread * spread;
        var size = y.Max(Math.Abs);

        AssertPair([intercept, Math.Sqrt(covariance[0, 0])], 1e-7, size, ours.Intercept, ours.InterceptError!.Value);
        AssertPair([slope, Math.Sqrt(covariance[1, 1])], 1e-7, Math.Abs(slope), ours.Slope, ours.SlopeError!.Value);
        Assert.Equal(GoodnessOfFit.RSquared(modelled, y), ours.RSquared!.Value, 1e-6);
    }

    /// <summary>The least squares of t over power, and standard errors, by derivatives that the library takes itself.</summary>
    private static (double[] Values, double[] Errors) Searched(IReadOnlyList<Trial> trials, double[] guess, Func<Vector<double>, double, double> seconds)
    {
        var objective = ObjectiveFunction.NonlinearModel(
            (parameters, watts) => watts.Map(one => seconds(parameters, one)),
            Vector<double>.Build.DenseOfEnumerable(trials.Select(one => one.Mean)),
            Vector<double>.Build.DenseOfEnumerable(trials.Select(one => one.Seconds)),
            accuracyOrder: 6);
        var result = new LevenbergMarquardtMinimizer(gradientTolerance: 1e-14, stepTolerance: 1e-14, functionTolerance: 1e-14, maximumIterations: 10_000)
            .FindMinimum(objective, Vector<double>.Build.Dense(guess));
        return ([.. result.MinimizingPoint], [.. result.StandardErrors]);
    }

    private static void AssertNear(double[] expected, double share, params double[] ours) =>
        Assert.All(expected.Zip(ours), pair => Assert.Equal(pair.First, pair.Second, share * Math.Abs(pair.First)));

    private static void AssertPair(double[] expected, double share, double size, double value, double error)
    {
        Assert.Equal(expected[0], value, share * Math.Max(size, Math.Abs(value)));
        Assert.Equal(expected[1], error, share * Math.Max(size, Math.Abs(error)));
    }
}
