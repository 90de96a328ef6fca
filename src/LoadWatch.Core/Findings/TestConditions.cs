using LoadWatch.Rows;

namespace LoadWatch.Findings;

/// <summary>Under which conditions a function test was done. Only tests of equal conditions are compared; what is not stated equals only what is not stated.</summary>
/// <param name="Hand"><c>left</c>, <c>right</c> or null.</param>
/// <param name="Device">In the clinic's own words, in small letters, or null.</param>
/// <param name="ChairCentimetres">Height of the seat in whole centimetres, or null.</param>
public sealed record TestConditions(string? Hand, string? Device, int? ChairCentimetres)
{
    public static TestConditions Of(TestRow row) => new(
        Word(row.Hand), Word(row.Device), row.ChairHeightMetres is { } height ? (int)Math.Round(100 * height) : null);

    /// <summary>What differs from others, for a sentence: <c>another device (stand 2, before not stated)</c>.</summary>
    public string DifferenceFrom(TestConditions before) => string.Join(" and ", Differences(before));

    private IEnumerable<string> Differences(TestConditions before)
    {
        if (Hand != before.Hand)
        {
            yield return $"another hand ({Told(Hand)}, before {Told(before.Hand)})";
        }

        if (Device != before.Device)
        {
            yield return $"another device ({Told(Device)}, before {Told(before.Device)})";
        }

        if (ChairCentimetres != before.ChairCentimetres)
        {
            yield return $"another chair height ({Told(Height(ChairCentimetres))}, before {Told(Height(before.ChairCentimetres))})";
        }
    }

    private static string? Height(int? centimetres) => centimetres is { } known ? FormattableString.Invariant($"{known} cm") : null;

    private static string Told(string? condition) => condition ?? "not stated";

    private static string? Word(string? cell) => string.IsNullOrWhiteSpace(cell) ? null : cell.Trim().ToLowerInvariant();
}
