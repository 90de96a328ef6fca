using CsCheck;
using LoadWatch.Days;
using MathNet.Numerics.Statistics;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

/// <summary>Laws of trends, and the statistics of MathNet.Numerics as a second opinion.</summary>
public class TrendLawTests
{
    private static readonly Gen<double?> Load = Gen.Frequency(
        (5, Gen.Int[0, 9000].Select(load => (double?)(load / 10.0))), (2, Gen.Int[0, 0].Select(_ => (double?)0)), (1, Gen.Int[0, 0].Select(_ => (double?)null)));

    [Fact]
    public void ARestDayNeverRaisesAcuteLoad() =>
        Load.Array[7, 60].Sample(loads =>
        {
            var days = Daily([.. loads, 0]);
            var (before, after) = (days[^2], days[^1]);
            return (before.Acute is null || after.Acute is null || after.Acute <= before.Acute)
                && (before.EwmaAcute is null || after.EwmaAcute <= before.EwmaAcute);
        });

    /// <summary>Kilojoules or joules, minutes or seconds: what has no unit does not change, the rest changes with it.</summary>
    [Fact]
    public void AnotherUnitChangesNothingButTheUnit() =>
        Gen.Select(Load.Array[28, 70], Gen.Double[0.001, 1000]).Sample((loads, factor) =>
        {
            var (day, scaled) = (Daily(loads)[^1], Daily(loads.Select(load => load * factor))[^1]);
            return Same(day.RatioCoupled, scaled.RatioCoupled) && Same(day.RatioUncoupled, scaled.RatioUncoupled) && Same(day.RatioEwma, scaled.RatioEwma)
                && Same(day.WeeklyChange, scaled.WeeklyChange) && Same(day.Monotony, scaled.Monotony)
                && Same(day.Acute * factor, scaled.Acute) && Same(day.Chronic * factor, scaled.Chronic) && Same(day.Strain * factor, scaled.Strain)
                && Same(day.ChronicMedian * factor, scaled.ChronicMedian);
        });

    [Fact]
    public void MeansDeviationsAndMediansAreThoseOfMathNet() =>
        Gen.Int[0, 9000].Select(load => load / 10.0).Array[35, 90].Where(loads => loads[^7..].Distinct().Count() > 1).Sample(loads =>
        {
            var days = Daily(loads);
            var week = loads[^7..];
            var chronics = days.Select(day => day.Chronic).OfType<double>();
            return Same(week.Mean() * 7, days[^1].Acute)
                && Same(week.Mean() / week.StandardDeviation(), days[^1].Monotony)
                && Same(loads[^28..].Mean() * 7, days[^1].Chronic)
                && Same(chronics.Median(), days[^1].ChronicMedian);
        });

    /// <summary>Loads whose squares are too small or too large for a number.</summary>
    [Theory]
    [InlineData(1e-200)]
    [InlineData(1e200)]
    [InlineData(1e300)]
    public void LoadsBeyondReasonStayFiniteOrUnknown(double load)
    {
        var day = Daily([.. Enumerable.Repeat(0.0, 34), load])[^1];

        Assert.True(day.Monotony is null || double.IsFinite(day.Monotony.Value));
        Assert.Equal(load, day.Acute!.Value, 1e-100 + (load * 1e-6));
    }

    private static bool Same(double? one, double? other) =>
        one is { } a && other is { } b ? Math.Abs(a - b) <= 1e-7 * Math.Max(1, Math.Abs(a)) : one is null && other is null;
}
