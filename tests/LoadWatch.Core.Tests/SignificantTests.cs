using CsCheck;

namespace LoadWatch;

public class SignificantTests
{
    [Theory]
    [InlineData(123456789.4, 123456789)]
    [InlineData(1.23456789012, 1.23456789)]
    [InlineData(123456789012, 123456789000)]
    [InlineData(-0.000123456789012, -0.000123456789)]
    [InlineData(1e-300, 0)]
    [InlineData(0, 0)]
    public void KeepsNineDigits(double value, double rounded) => Assert.Equal(rounded, Significant.Round(value));

    [Fact]
    public void EveryFiniteNumberStaysFiniteAndNear() =>
        Gen.Double.Where(double.IsFinite).Sample(value =>
            Math.Abs(Significant.Round(value) - value) <= Math.Max(1e-200, Math.Abs(value) * 1e-8));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void WhatIsNotFiniteIsRefused(double value) => Assert.Throws<ArgumentException>(() => Significant.Round(value));
}
