namespace LoadWatch.Rows;

/// <summary>What a row of kind <c>tests</c> says: a function test or a reference value. Unknown is null.</summary>
/// <param name="Test">A word of the function tests (<c>grip_strength</c>) or of the anchors (<c>heart_rate_max</c>, <c>one_repetition_max</c>).</param>
/// <param name="Value">In <paramref name="Unit"/>; null where there is only an outcome.</param>
/// <param name="Exercise">Of a one-repetition maximum.</param>
/// <param name="Machine">Of a one-repetition maximum.</param>
/// <param name="Outcome">Null for a test done as described.</param>
/// <param name="Hand"><c>left</c> or <c>right</c>.</param>
/// <param name="Device">Which dynamometer, course or clock, in the clinic's own words.</param>
/// <param name="ChairHeightMetres">Height of the seat.</param>
public sealed record TestRow(
    string Test,
    double? Value,
    string? Unit,
    string? Exercise,
    string? Machine,
    TestOutcome? Outcome,
    string? Hand,
    string? Device,
    double? ChairHeightMetres) : RowContent;

/// <summary>How a function test ended otherwise than as described.</summary>
public enum TestOutcome
{
    Unable,
    UsedArms,
}
