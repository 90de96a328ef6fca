using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// A person's own line from one quantity to another, y = a + b x (<see cref="LeastSquares"/>).
/// </summary>
/// <param name="Wanted">Name of y.</param>
/// <param name="From">Name of x.</param>
/// <param name="Intercept">a, in the unit of y, rounded to 9 significant digits.</param>
/// <param name="Slope">b, units of y per unit of x, above 0, rounded likewise.</param>
/// <param name="StandardError">In the unit of y, 0 or more.</param>
/// <param name="Pairs">Sessions behind it, <see cref="LoadConversion.FewestPairs"/> or more.</param>
/// <param name="Since">First day whose sessions count.</param>
/// <param name="Before">First day whose sessions count no more.</param>
public sealed record ConversionLine(
    string Wanted, string From, double Intercept, double Slope, double StandardError, int Pairs, LocalDate Since, LocalDate Before)
{
    /// <summary>y for a value of x, never below 0, rounded to 9 significant digits.</summary>
    public double Apply(double value) => Significant.Round(Math.Clamp(Intercept + (Slope * value), 0, double.MaxValue));
}
