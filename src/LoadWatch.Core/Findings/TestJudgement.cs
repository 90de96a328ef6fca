using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>What the latest test of its kind asks to look at.</summary>
internal enum TestReason
{
    /// <summary>It could not be done, or was done with the arms.</summary>
    NotDone,

    /// <summary>Beyond the published cut-off.</summary>
    CutOff,

    /// <summary>Down by more than the error of the test, under equal conditions.</summary>
    Fall,

    /// <summary>Down by more than the error, but under other conditions: told, and no alert.</summary>
    OtherConditions,
}

/// <param name="Since">First date of the unbroken run.</param>
/// <param name="Result">The test that is judged; null where it was not done.</param>
/// <param name="Before">The test that it is compared with.</param>
/// <param name="Limit">The limit that was passed, in the unit of the test; null where it was not done.</param>
internal sealed record TestJudgement(LocalDate Since, LocalDate Date, TestReason Reason, TestResult? Result, TestResult? Before, double? Limit, TestOutcome? Outcome);

/// <summary>What is kept of one function test of a person from date to date.</summary>
/// <param name="Judged">Null where nothing is to be looked at, or the test has aged.</param>
/// <param name="Latest">The latest value of each set of conditions, the newest first.</param>
internal sealed record TestsKnown(TestJudgement? Judged, IReadOnlyList<TestResult> Latest)
{
    private const int MostConditions = 12;

    public static TestsKnown None { get; } = new(null, []);

    /// <summary>Takes up the tests of a date.</summary>
    public TestsKnown After(TestDate tests, FunctionTest test, double? cutOff, FunctionTestLimits limits) => new(
        new Comparison(test, cutOff, limits, this).Of(tests),
        [.. tests.Each, .. Latest.Where(result => tests.Each.All(one => one.Conditions != result.Conditions)).Take(MostConditions)]);

    private sealed class Comparison(FunctionTest test, double? cutOff, FunctionTestLimits limits, TestsKnown before)
    {
        private readonly double? error = test.Error(limits);

        public TestJudgement? Of(TestDate tests)
        {
            if (tests.Best is not { } best)
            {
                return tests.Outcome is { } outcome ? new TestJudgement(Since(tests.Date), tests.Date, TestReason.NotDone, null, before.Latest.FirstOrDefault(), null, outcome) : null;
            }

            return ByCutOff(best) ?? ByFall(tests) ?? ByOtherConditions(best);
        }

        private LocalDate Since(LocalDate date) => before.Judged is { Reason: not TestReason.OtherConditions } standing ? standing.Since : date;

        /// <summary>Once beyond the cut-off, a test must be better than it by some to end that.</summary>
        private TestJudgement? ByCutOff(TestResult best)
        {
            if (cutOff is not { } limit)
            {
                return null;
            }

            var stands = before.Judged?.Reason == TestReason.CutOff && test.Fall(test.Better(limit, limits.ReturnShare * (error ?? 0)), best.Value) > 0;
            return test.IsBeyond(best.Value, limit) || stands
                ? new TestJudgement(Since(best.Date), best.Date, TestReason.CutOff, best, LikeBefore(best), limit, null)
                : null;
        }

        /// <summary>The largest fall among tests of equal conditions. What fell stands until a test comes back to near the one before the fall.</summary>
        private TestJudgement? ByFall(TestDate tests)
        {
            if (error is not { } allowed)
            {
                return null;
            }

            return tests.Each
                .Select(result => Fall(result, allowed))
                .OfType<TestJudgement>()
                .MaxBy(fall => test.Fall(fall.Before!.Value, fall.Result!.Value));
        }

        private TestJudgement? Fall(TestResult result, double allowed)
        {
            if (before.Judged is { Reason: TestReason.Fall, Before: { } high } && high.Conditions == result.Conditions && test.Fall(high.Value, result.Value) > Significant.Round((1 - limits.ReturnShare) * allowed))
            {
                return new TestJudgement(Since(result.Date), result.Date, TestReason.Fall, result, high, test.Better(high.Value, -allowed), null);
            }

            return LikeBefore(result) is { } earlier && test.Fall(earlier.Value, result.Value) > allowed
                ? new TestJudgement(Since(result.Date), result.Date, TestReason.Fall, result, earlier, test.Better(earlier.Value, -allowed), null)
                : null;
        }

        private TestJudgement? ByOtherConditions(TestResult best) =>
            error is { } allowed && LikeBefore(best) is null && before.Latest.FirstOrDefault() is { } other && test.Fall(other.Value, best.Value) > allowed
                ? new TestJudgement(best.Date, best.Date, TestReason.OtherConditions, best, other, test.Better(other.Value, -allowed), null)
                : null;

        private TestResult? LikeBefore(TestResult result) => before.Latest.FirstOrDefault(one => one.Conditions == result.Conditions);
    }
}
