using System.ComponentModel.DataAnnotations;
using System.Globalization;

namespace LoadWatch.Activities;

/// <summary>A list of so many numbers within bounds.</summary>
[AttributeUsage(AttributeTargets.Property)]
public sealed class NumbersAttribute(int count, double lowest, double highest) : ValidationAttribute
{
    public int Count => count;

    public double Lowest => lowest;

    public double Highest => highest;

    /// <summary>Each above the one before.</summary>
    public bool IsRising { get; init; }

    public string Wanted => string.Create(CultureInfo.InvariantCulture, $"wants {count} numbers from {lowest} to {highest}{(IsRising ? ", rising" : "")}");

    public override bool IsValid(object? value) =>
        value is IReadOnlyList<double> numbers
        && numbers.Count == count
        && numbers.All(number => number >= lowest && number <= highest)
        && (!IsRising || numbers.Zip(numbers.Skip(1)).All(pair => pair.First < pair.Second));
}
