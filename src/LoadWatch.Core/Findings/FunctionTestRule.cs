// The latest function test against its published cut-off (FunctionTests) and against the one before, down by more than the error of the test (limits, a choice).
using LoadWatch.People;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// A function test lies beyond a published cut-off, or fell by more than its error. Stands from the date of the test to the next of its kind, a year at most. For
/// those contacts only who may see health; it names a figure and a cut-off, nothing else.
/// </summary>
public sealed class FunctionTestRule : IRule
{
    public const string RuleName = "function_test";

    public string Name => RuleName;

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.FunctionTest;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) =>
        FunctionTests.All.SelectMany(test => Evaluate(subject, test)).OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, FunctionTest test)
    {
        var results = Results(subject.Tests, test);
        var key = $"{Name}/{test.Word}";
        var known = subject.Memory.Before<Known>(key);
        if (results.Count == 0 && known is null)
        {
            yield break;
        }

        var next = 0;
        foreach (var day in subject.Judged)
        {
            for (; next < results.Count && results[next].Date <= day.Date; next++)
            {
                known = new Known(Judge(subject, test, results[next], known?.Valued), results[next].Value.HasValue ? results[next] : known?.Valued);
            }

            if (known?.Judged is { } ended && day.Date >= ended.Result.Date.PlusDays(subject.Limits.FunctionTest.HoldDays))
            {
                known = known with { Judged = null };
            }

            subject.Memory.Keep(day.Date, key, known is { Judged: null, Valued: null } ? null : known);
            if (known?.Judged is { } judged)
            {
                yield return Find(subject.Person, test, day.Date, judged);
            }
        }
    }

    /// <summary>One result a date: the better hand or try; one that could not be done only where nothing else was.</summary>
    private static List<Result> Results(IReadOnlyList<DatedTest> tests, FunctionTest test) =>
    [
        .. tests
            .Where(dated => dated.Test.Test == test.Word)
            .GroupBy(dated => dated.Date)
            .OrderBy(sameDate => sameDate.Key)
            .Select(sameDate => ResultOf(sameDate.Key, [.. sameDate.Select(dated => dated.Test)], test)),
    ];

    private static Result ResultOf(LocalDate date, List<TestRow> rows, FunctionTest test)
    {
        var done = rows.Where(row => row is { Value: not null, Outcome: null }).Select(row => row.Value!.Value).ToList();
        double? value = done.Count == 0 ? null : test.MoreIsBetter ? done.Max() : done.Min();
        return new Result(date, value, value is null ? rows.Select(row => row.Outcome).FirstOrDefault(outcome => outcome is not null) : null);
    }

    private static Judgement? Judge(RuleSubject subject, FunctionTest test, Result result, Result? before)
    {
        var limit = test.Limit(subject.Person.Sex);
        if (result.Value is not { } value)
        {
            return result.Outcome is { } outcome ? new Judgement(result, before, limit, 0, Ended(test, outcome)) : null;
        }

        if (limit is { } cutOff && test.IsBeyond(value, cutOff))
        {
            return new Judgement(result, before, limit, 0, $"{test.Words} the published cut-off of {Number(cutOff)} {test.Unit}");
        }

        var error = Error(test, subject.Limits.FunctionTest);
        var fall = before?.Value is { } earlier ? Significant.Round(test.MoreIsBetter ? earlier - value : value - earlier) : 0;
        return fall > error
            ? new Judgement(result, before, limit, error, $"{Number(before!.Value!.Value)} {test.Unit} the time before, a change beyond the error of {Number(error)} {test.Unit}")
            : null;
    }

    private static string Ended(FunctionTest test, TestOutcome outcome) => outcome == TestOutcome.UsedArms ? "done with the arms" : "could not be done";

    private static double Error(FunctionTest test, FunctionTestLimits limits) => test.Word switch
    {
        FunctionTests.Grip => limits.GripKilograms,
        FunctionTests.ChairStands => limits.ChairStandSeconds,
        FunctionTests.Gait => limits.GaitMetresPerSecond,
        FunctionTests.UpAndGo => limits.UpAndGoSeconds,
        FunctionTests.PerformanceBattery => limits.PerformanceBatteryPoints,
        _ => double.PositiveInfinity,
    };

    private Finding Find(Person person, FunctionTest test, LocalDate date, Judgement judged) => new(
        person.Id,
        date,
        Name,
        Region: null,
        Severity.Notice,
        judged.Result.Date,
        judged.Result.Value ?? 0,
        judged.CutOff ?? judged.Error,
        judged.Result.Value is null ? "not done" : test.Unit,
        $"{test.Name}{(judged.Result.Value is { } value ? $" {Number(value)} {test.Unit}" : "")} on {Wording.Date(judged.Result.Date, date)}: {judged.Why}.",
        new Evidence(
            "the latest test of its kind (the better hand or try of its date) against a published cut-off, and against the one before",
            "Cruz-Jentoft et al. 2019, Age Ageing 48:16-31; errors of the tests: from memory, a choice",
            [
                new("value", judged.Result.Value, test.Unit, $"on {Wording.IsoDate(judged.Result.Date)}"),
                new("value_before", judged.Before?.Value, test.Unit, judged.Before is { } before ? $"on {Wording.IsoDate(before.Date)}" : null),
                new("cut_off", judged.CutOff, test.Unit),
                new("error", judged.Error > 0 ? judged.Error : null, test.Unit),
            ]))
    {
        Quantity = test.Word,
    };

    private static string Number(double value) => FormattableString.Invariant($"{value:0.##}");

    private sealed record Result(LocalDate Date, double? Value, TestOutcome? Outcome);

    private sealed record Judgement(Result Result, Result? Before, double? CutOff, double Error, string Why);

    /// <summary>What was made of the latest test, and the latest that has a value.</summary>
    private sealed record Known(Judgement? Judged, Result? Valued);
}
