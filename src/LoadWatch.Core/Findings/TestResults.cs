using LoadWatch.Loads;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>What a function test gave on one date under one set of conditions: the best try.</summary>
internal sealed record TestResult(LocalDate Date, double Value, TestConditions Conditions)
{
    /// <summary>Of chair stands; null for every other test.</summary>
    public StandingUp? Power { get; init; }
}

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
            .Select(sameDate => Of(sameDate.Key, [.. sameDate], test)),
    ];

    private static TestDate Of(LocalDate date, List<DatedTest> rows, FunctionTest test)
    {
        List<TestResult> each =
        [
            .. rows
                .Where(row => row.Test is { Value: not null, Outcome: null })
                .GroupBy(row => TestConditions.Of(row.Test))
                .Select(tries => Of(tries.Key, BestOf(tries, test)))
                .OrderBy(result => test.MoreIsBetter ? -result.Value : result.Value)
                .ThenBy(result => result.Conditions.Hand, StringComparer.Ordinal)
                .ThenBy(result => result.Conditions.Device, StringComparer.Ordinal)
                .ThenBy(result => result.Conditions.ChairCentimetres),
        ];
        var outcome = each.Count == 0 ? rows.Select(row => row.Test.Outcome).FirstOrDefault(outcome => outcome is not null) : null;
        return new TestDate(date, each.FirstOrDefault(), each, outcome);
    }

    private static TestResult Of(TestConditions conditions, DatedTest best) =>
        new(best.Date, best.Test.Value!.Value, conditions) { Power = StandingUp.Of(best.Test, best.Body) };

    private static DatedTest BestOf(IEnumerable<DatedTest> tries, FunctionTest test) =>
        test.MoreIsBetter ? tries.MaxBy(row => row.Test.Value)! : tries.MinBy(row => row.Test.Value)!;
}
