// Days since the latest function test of a kind, against the interval at which it is to be done again. A choice.
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// A function test is due again. Like silence it is about what did not come, so time alone raises it; the next test of its kind ends it, also one that could not be done. For those
/// contacts only who may see health.
/// </summary>
public sealed class TestOverdueRule : IRule
{
    public string Name => "test_overdue";

    public RuleRecord Record { get; } = new TestOverdueRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.TestOverdue;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) =>
        FunctionTests.All.SelectMany(test => Evaluate(subject, test)).OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, FunctionTest test)
    {
        var limits = subject.Limits.TestOverdue;
        var tested = subject.Tests.Where(dated => dated.Test.Test == test.Word).Select(dated => dated.Date).Distinct().Order().ToList();
        var key = $"{Name}/{test.Word}";
        var counted = subject.Memory.Before<Counted>(key)
            ?? (limits.Tests.Contains(test.Word, StringComparer.Ordinal) && subject.Judged.FirstOrDefault() is { } first ? new Counted(first.Date, Ever: false) : null);
        if (tested.Count == 0 && counted is null)
        {
            yield break;
        }

        var (next, muted) = (0, counted?.Muted);
        foreach (var day in subject.Judged)
        {
            for (; next < tested.Count && tested[next] <= day.Date; next++)
            {
                counted = new Counted(tested[next], Ever: true);
            }

            muted = counted is not null && PlanMutes.Of(Name, day.Plan) is { } state ? muted?.State == state ? muted : new Muting(state, day.Date) : null;
            counted = counted is null ? null : counted with { Muted = muted };
            subject.Memory.Keep(day.Date, key, counted);
            if (counted is not null && Period.DaysBetween(counted.From, day.Date) > limits.IntervalDays)
            {
                yield return Find(subject.Person, test, day.Date, counted, limits).Unless(muted);
            }
        }
    }

    private Finding Find(Person person, FunctionTest test, LocalDate date, Counted counted, TestOverdueLimits limits)
    {
        var days = Period.DaysBetween(counted.From, date);
        var last = counted.Ever ? $"last on {Wording.Date(counted.From, date)}" : $"none since {Wording.Date(counted.From, date)}";
        return new(
            person.Id,
            date,
            Name,
            Region: null,
            limits.Severity.Severity(),
            counted.From.PlusDays(limits.IntervalDays + 1),
            days,
            limits.IntervalDays,
            "days",
            $"{test.Name} is due: {last}, to be done every {Wording.Days(limits.IntervalDays)}.",
            new Evidence(
                "days since the latest test of its kind, against the interval",
                "a choice",
                [
                    new("days_since", days, "days", $"{(counted.Ever ? "tested on" : "counted from")} {Wording.IsoDate(counted.From)}"),
                    new("interval", limits.IntervalDays, "days"),
                ]))
        {
            Quantity = test.Word,
        };
    }

    /// <param name="From">Date of the latest test, or the first day where there was none.</param>
    private sealed record Counted(LocalDate From, bool Ever, Muting? Muted = null);
}
