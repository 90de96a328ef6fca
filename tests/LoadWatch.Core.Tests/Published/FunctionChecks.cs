using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Rows;
using LoadWatch.Tests.Days;

namespace LoadWatch.Tests.Published;

/// <summary>Function tests of older people, on either side of a cut-off.</summary>
internal static class FunctionChecks
{
    private static readonly Source Ewgsop2 = new(
        "Cruz-Jentoft et al. 2019, Sarcopenia: revised European consensus on definition and diagnosis, Age Ageing 48:16-31", Reading.Read);

    private static readonly Source FromMemory = new("Cruz-Jentoft et al. 2019, Age Ageing 48:16-31", Reading.FromMemory);

    public static IReadOnlyList<PublishedCheck> Rows { get; } =
    [
        new("grip of men at 27.0 and 26.9 kg, of women at 16.0 and 15.9 kg", Ewgsop2, ["not beyond", "beyond", "not beyond", "beyond"], () =>
            [Told("grip_strength", 27.0, Sex.Male), Told("grip_strength", 26.9, Sex.Male), Told("grip_strength", 16.0), Told("grip_strength", 15.9)]),
        new("gait speed of 0.81 and 0.80 m/s", Ewgsop2, ["not beyond", "beyond"], () => [Told("gait_speed", 0.81), Told("gait_speed", 0.80)]),
        new("timed up and go of 19.9 and 20.0 s", Ewgsop2, ["not beyond", "beyond"], () => [Told("timed_up_and_go", 19.9), Told("timed_up_and_go", 20.0)]),
        new("five chair stands in 15.0 and 15.1 s", FromMemory, ["not beyond", "beyond"], () => [Told("chair_stands_5", 15.0), Told("chair_stands_5", 15.1)]),
        new("short physical performance battery of 9 and 8 points", FromMemory, ["not beyond", "beyond"], () =>
            [Told("short_physical_performance_battery", 9), Told("short_physical_performance_battery", 8)]),
        new("400 m walk in 359 and 360 s", FromMemory, ["not beyond", "beyond"], () => [Told("walk_400_m", 359), Told("walk_400_m", 360)]),
    ];

    private static string Told(string test, double value, Sex sex = Sex.Female)
    {
        List<Day> days = [.. Enumerable.Range(0, 5).Select(day => new Day { Person = "anna", Date = Training.On(day), State = DayState.Unknown })];
        var tests = new[] { new DatedTest(Training.On(2), new TestRow(test, value, null, null, null, null, null, null, null)) };
        return new FunctionTestRule().Evaluate(new RuleSubject(Training.Anna with { Sex = sex }, days, new RuleLimits()) { Tests = tests }).Any() ? "beyond" : "not beyond";
    }
}
