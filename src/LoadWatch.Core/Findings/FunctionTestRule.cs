// The latest function test against its published cut-off (FunctionTests) and against the one before of equal conditions, down by more than the error of the test (limits, a
// choice). The better hand or try of a date counts for the cut-off, as the source has it.
using System.Globalization;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// A function test lies beyond a published cut-off, fell by more than its error, or could not be done. Stands from the date of the test to the next of its kind that is
/// better by some, a year at most. A fall under other conditions (hand, device, height of the chair) is told and is no alert. For those contacts only who may see health; it
/// names a figure and a cut-off, nothing else.
/// </summary>
public sealed class FunctionTestRule : IRule
{
    public const string RuleName = "function_test";

    public string Name => RuleName;

    public RuleRecord Record { get; } = new FunctionTestRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.FunctionTest;

    public IEnumerable<Finding> Evaluate(RuleSubject subject) =>
        FunctionTests.All.SelectMany(test => Evaluate(subject, test)).OrderBy(finding => finding.Date);

    private IEnumerable<Finding> Evaluate(RuleSubject subject, FunctionTest test)
    {
        var limits = subject.Limits.FunctionTest;
        var dates = TestDate.Of(subject.Tests, test);
        var key = $"{Name}/{test.Word}";
        var known = subject.Memory.Before<TestsKnown>(key);
        if (dates.Count == 0 && known is null)
        {
            yield break;
        }

        var cutOff = test.Limit(limits, subject.Person.Sex);
        var next = 0;
        foreach (var day in subject.Judged)
        {
            for (; next < dates.Count && dates[next].Date <= day.Date; next++)
            {
                known = (known ?? TestsKnown.None).After(dates[next], test, cutOff, limits);
            }

            if (known?.Judged is { } ended && day.Date >= ended.Date.PlusDays(limits.HoldDays))
            {
                known = known with { Judged = null };
            }

            subject.Memory.Keep(day.Date, key, known is { Judged: null, Latest.Count: 0 } ? null : known);
            if (known?.Judged is { } judged)
            {
                yield return Find(subject.Person, test, day.Date, judged, cutOff, limits);
            }
        }
    }

    private Finding Find(Person person, FunctionTest test, LocalDate date, TestJudgement judged, double? cutOff, FunctionTestLimits limits) => new(
        person.Id,
        date,
        Name,
        Region: null,
        judged.Reason == TestReason.OtherConditions ? Severity.Note : limits.Severity.Severity(),
        judged.Since,
        judged.Result?.Value ?? 1,
        judged.Limit ?? 1,
        judged.Result is null ? "tests not done" : test.Unit,
        $"{test.Name}{(judged.Result is { } result ? $" {Number(result.Value)} {test.Unit}" : "")} on {Wording.Date(judged.Date, date)}: {Why(test, judged, date)}.{Power(judged.Result?.Power)}",
        Basis(test, judged, cutOff, limits))
    {
        Quantity = test.Word,
    };

    private static string Why(FunctionTest test, TestJudgement judged, LocalDate date) => judged switch
    {
        { Reason: TestReason.NotDone } => Ended(judged.Outcome),
        { Reason: TestReason.CutOff, Result: { } result, Limit: { } limit } when test.IsBeyond(result.Value, limit) => $"{test.Words} the published cut-off of {Number(limit)} {test.Unit}",
        { Reason: TestReason.CutOff, Limit: { } limit } => $"within the published cut-off of {Number(limit)} {test.Unit}, but by less than it takes to end what stood",
        { Reason: TestReason.Fall, Before: { } before, Limit: { } limit } =>
            $"{Number(before.Value)} {test.Unit} on {Wording.Date(before.Date, date)}, a change beyond the error of the test: the limit is {Number(limit)} {test.Unit}",
        { Before: { } before, Result: { } result } =>
            $"{Number(before.Value)} {test.Unit} on {Wording.Date(before.Date, date)}, but with {result.Conditions.DifferenceFrom(before.Conditions)}: not compared, so no alert",
        _ => throw new ArgumentException("a judgement without what it rests on", nameof(judged)),
    };

    /// <summary>A figure beside the test, without a word on what it means.</summary>
    private static string Power(StandingUp? power) => power switch
    {
        { WattsPerKilogram: { } byMass, Watts: { } watts } => $" Sit-to-stand power {byMass.ToString("0.0", CultureInfo.InvariantCulture)} W/kg, {Wording.Number(watts)} W.",
        { WattsPerKilogram: { } byMass } => $" Sit-to-stand power {byMass.ToString("0.0", CultureInfo.InvariantCulture)} W/kg.",
        _ => "",
    };

    private static string Ended(TestOutcome? outcome) => outcome == TestOutcome.UsedArms ? "done with the arms" : "could not be done";

    private static Evidence Basis(FunctionTest test, TestJudgement judged, double? cutOff, FunctionTestLimits limits) => new(
        "the latest test of its kind (the better hand or try of its date) against a published cut-off, and against the latest one before with the same hand, device and chair height"
            + (judged.Result?.Power is null ? "" : $"; {StandingUp.Formula}"),
        "Cruz-Jentoft et al. 2019, Age Ageing 48:16-31; errors of the tests: from memory, a choice" + (judged.Result?.Power is null ? "" : $"; {StandingUp.Source}"),
        [
            new("value", judged.Result?.Value, test.Unit, judged.Result is { } result ? Told(result) : $"on {Wording.IsoDate(judged.Date)}, {Ended(judged.Outcome)}"),
            new("value_before", judged.Before?.Value, test.Unit, judged.Before is { } before ? Told(before) : null),
            new("cut_off", cutOff, test.Unit),
            new("error", test.Error(limits), test.Unit),
            new("return_share", limits.ReturnShare, "share"),
            new("hold", limits.HoldDays, "days"),
            .. judged.Result?.Power is { } power ? Of(power) : [],
        ]);

    private static EvidenceItem[] Of(StandingUp power) =>
    [
        new("sit_to_stand_power", power.Watts, "W", power.Missing),
        new("sit_to_stand_power_by_mass", power.WattsPerKilogram, "W/kg", power.WattsPerKilogram is null ? power.Missing : null),
        new("body_mass", power.Body.MassKilograms, "kg"),
        new("height", power.Body.HeightMetres, "m"),
        new("chair_height", power.ChairHeightMetres, "m"),
    ];

    private static string Told(TestResult result) => string.Join(
        ", ",
        new[]
        {
            $"on {Wording.IsoDate(result.Date)}",
            result.Conditions.Hand is { } hand ? $"{hand} hand" : null,
            result.Conditions.Device is { } device ? $"device {device}" : null,
            result.Conditions.ChairCentimetres is { } height ? FormattableString.Invariant($"chair of {height} cm") : null,
        }.OfType<string>());

    private static string Number(double value) => FormattableString.Invariant($"{value:0.##}");
}
