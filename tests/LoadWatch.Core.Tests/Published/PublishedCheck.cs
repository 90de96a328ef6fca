using System.Globalization;

namespace LoadWatch.Tests.Published;

/// <summary>What a source prints, beside what the product makes of the same input: a test and a line of the table in <c>tests/README.md</c> in one.</summary>
public sealed class PublishedCheck
{
    private readonly string[] published;
    private readonly Lazy<string[]> ours;
    private readonly Lazy<bool> holds;
    private readonly string unit;

    /// <param name="what">What is looked at, and on which input.</param>
    /// <param name="published">The numbers as printed.</param>
    /// <param name="unit">Of the numbers; empty without one.</param>
    /// <param name="ours">The same numbers from the product, in the same order.</param>
    public PublishedCheck(string what, Source source, double[] published, Tolerance tolerance, string unit, Func<double[]> ours)
    {
        (What, Source, Tolerance) = (what, source, tolerance.ToString());
        this.unit = unit;
        this.published = [.. published.Select(number => number.ToString("0.################", CultureInfo.InvariantCulture))];
        var found = new Lazy<double[]>(ours);
        this.ours = new Lazy<string[]>(() => [.. found.Value.Select(number => Math.Round(number, tolerance.Decimals).ToString("0.#########", CultureInfo.InvariantCulture))]);
        holds = new Lazy<bool>(() => found.Value.Length == published.Length
            && found.Value.Select((number, index) => Math.Abs(number - published[index]) <= tolerance.At(index, published[index])).All(within => within));
    }

    /// <summary>The same for names and classes, which are right or wrong.</summary>
    public PublishedCheck(string what, Source source, string[] published, Func<string[]> ours)
    {
        (What, Source, Tolerance) = (what, source, "none");
        unit = "";
        this.published = published;
        this.ours = new Lazy<string[]>(ours);
        holds = new Lazy<bool>(() => this.ours.Value.SequenceEqual(published, StringComparer.Ordinal));
    }

    public string What { get; }

    public Source Source { get; }

    public string Tolerance { get; }

    public bool Holds => holds.Value;

    /// <summary>The line of the table.</summary>
    /// <param name="list">The list that the check stands in.</param>
    public string Line(string list) =>
        $"| {What} | {Source.Words} | {Source.How} | {InUnit(published)} | {InUnit(ours.Value)} | {Tolerance} | `{list}` |";

    private string InUnit(string[] values) => string.Join(", ", values) + (unit.Length == 0 ? "" : $" {unit}");
}
