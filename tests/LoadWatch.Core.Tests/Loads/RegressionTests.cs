using CsCheck;
using MathNet.Numerics;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>MathNet.Numerics as a second opinion on least squares.</summary>
public class RegressionTests
{
    [Fact]
    public void AConversionIsTheLineOfMathNet() =>
        Gen.Select(Gen.Double[1, 500], Gen.Double[0, 100]).Array[10, 60].Where(pairs => pairs.Max(pair => pair.Item1) - pairs.Min(pair => pair.Item1) > 1).Sample(pairs =>
        {
            var x = pairs.Select(pair => Significant.Round(pair.Item1)).ToArray();
            var y = x.Zip(pairs, (one, pair) => Significant.Round((2 * one) + pair.Item2)).ToArray();
            var (intercept, slope) = Fit.Line(x, y);
            var error = GoodnessOfFit.StandardError(x.Select(one => intercept + (slope * one)), y, 2);
            var line = LoadConversion.For([.. x.Zip(y, Session)], new LocalDate(2026, 3, 10), "banister_trimp", "foster_load");
            return slope <= 0.01
                || (Near(slope, line!.Slope, 1) && Near(intercept, line.Intercept, 100) && Near(error, line.StandardError, 100));
        });

    private static bool Near(double expected, double found, double scale) => Math.Abs(expected - found) <= 1e-7 * Math.Max(scale, Math.Abs(expected));

    private static SessionLoads Session(double rating, double impulse) => new(
        new LocalDate(2026, 2, 10),
        [new Quantity("foster_load", rating, "AU", Estimated: false), new Quantity("banister_trimp", impulse, "AU", Estimated: false)]);
}
