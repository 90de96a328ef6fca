using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>What a function test gave on one date under one set of conditions: the best try.</summary>
internal sealed record TestResult(LocalDate Date, double Value, TestConditions Conditions);

/// <summary>All tries of one function test on one date.</summary>
/// <param name="Best">The best of the values, of whatever conditions; null where there is none.</param>
/// <param name="Each">The best value of each set of conditions.</param>
/// <param name="Outcome">Why there is no value; null where there is one.</param>
internal sealed record TestDate(LocalDate Date, TestResult? Best, IReadOnlyList<TestResult> Each, TestOutcome? Outcome)
{
    /// <summary>One a date, in order; a try that could not be done counts only where no other was.</summary>
    public static List<TestDate> Of(IReadOnlyList<DatedTest> tests, FunctionTest test) =>
    [
        .. tests
            .Where(dated => dated.Test.Test == test.Word)
            .GroupBy(dated => dated.Date)
            .OrderBy(sameDate => sameDate.Key)
            .Select(sameDate => Of(sameDate.Key, [.. sameDate.Select(dated => dated.Test)], test)),
    ];

    private static TestDate Of(LocalDate date, List<TestRow> rows, FunctionTest test)
    {
        List<TestResult> each =
        [
            .. rows
                .Where(row => row is { Value: not null, Outcome: null })
                .GroupBy(TestConditions.Of)
                .Select(tries => new TestResult(date, BestOf(tries.Select(row => row.Value!.Value), test), tries.Key))
                .OrderBy(result => test.MoreIsBetter ? -result.Value : result.Value)
                .ThenBy(result => result.Conditions.Hand, StringComparer.Ordinal)
                .ThenBy(result => result.Conditions.Device, StringComparer.Ordinal)
                .ThenBy(result => result.Conditions.ChairCentimetres),
        ];
        var outcome = each.Count == 0 ? rows.Select(row => row.Outcome).FirstOrDefault(outcome => outcome is not null) : null;
        return new TestDate(date, each.FirstOrDefault(), each, outcome);
    }

    private static double BestOf(IEnumerable<double> values, FunctionTest test) => test.MoreIsBetter ? values.Max() : values.Min();
}
