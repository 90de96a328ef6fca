using System.Globalization;

namespace LoadWatch.Tests.Published;

/// <summary>How far a value may be from the published one. A bare number is a distance in the value's unit.</summary>
/// <param name="Distances">One for all, or one for each value; 0 or more.</param>
/// <param name="IsRelative">Distances are shares of the published value.</param>
public sealed record Tolerance(IReadOnlyList<double> Distances, bool IsRelative = false)
{
    /// <summary>A share of each published value, 0.04 for 4 %.</summary>
    public static Tolerance Share(double share) => new([share], IsRelative: true);

    /// <summary>One for each value, such as the published standard deviations.</summary>
    public static Tolerance Each(params double[] distances) => new(distances);

    public static implicit operator Tolerance(double distance) => new([distance]);

    public double At(int index, double published) => Distances[index % Distances.Count] * (IsRelative ? Math.Abs(published) : 1);

    /// <summary>Decimals in which a difference of a tenth of this size shows.</summary>
    public int Decimals => IsRelative ? 3 : Distances.Max(distance => Math.Clamp(1 + (int)Math.Ceiling(-Math.Log10(Math.Max(distance, 1e-9))), 0, 9));

    public override string ToString() => IsRelative
        ? string.Create(CultureInfo.InvariantCulture, $"{Distances[0] * 100:0.##} %")
        : string.Join(", ", Distances.Select(distance => distance == 0 ? "none" : distance.ToString("0.##########", CultureInfo.InvariantCulture)));
}
