using System.Globalization;
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

    /// <summary>Around every power of ten: where nine digits begin to end elsewhere. The text with nine digits is the runtime's own.</summary>
    [Fact]
    public void IsTheNumberWrittenWithNineDigitsAroundEveryPowerOfTen()
    {
        for (var power = -15; power <= 22; power++)
        {
            var ten = double.Parse($"1e{power}", CultureInfo.InvariantCulture);
            foreach (var value in new[] { ten, Math.BitDecrement(ten), Math.BitIncrement(ten), ten * 0.999999999, ten * 1.00000001, ten * 5 })
            {
                var written = double.Parse(value.ToString("E8", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
                Assert.InRange(Significant.Round(value), written * (1 - 1e-15), written * (1 + 1e-15));
            }
        }
    }

    /// <summary>What is stored does not hang on how the power of ten is found.</summary>
    [Fact]
    public void ALogarithmWouldFindTheSame() => Gen.Double[-1e6, 1e6].Select(Gen.Int[-12, 12], (value, power) => value * Math.Pow(10, power)).Where(value => Math.Abs(value) > 1e-200).Sample(value =>
    {
        var digits = 8 - (int)Math.Floor(Math.Log10(Math.Abs(value)));
        return digits is < 0 or > 15 || Significant.Round(value).Equals(Math.Round(value, digits));
    }, iter: 20_000);

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void WhatIsNotFiniteIsRefused(double value) => Assert.Throws<ArgumentException>(() => Significant.Round(value));
}
