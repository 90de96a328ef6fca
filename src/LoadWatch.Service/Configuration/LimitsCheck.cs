using LoadWatch.Findings;
using LoadWatch.Loads;

namespace LoadWatch.Service.Configuration;

/// <summary>Finds limits that contradict each other although each is in its range, and names of quantities that cannot be.</summary>
public static class LimitsCheck
{
    private const int LongestName = 60;

    /// <summary>Pairs of path below the limits (<c>load_ratio.return</c>) and reason.</summary>
    public static IEnumerable<(string Path, string Reason)> Faults(RuleLimits limits) =>
        Pairs(limits).Where(pair => pair.Low > pair.High).Select(pair => (pair.Path, pair.Reason))
            .Concat(Names("load_ratio", limits.LoadRatio.Quantities))
            .Concat(Names("weekly_jump", limits.WeeklyJump.Quantities))
            .Concat(Names("falling_load", limits.FallingLoad.Quantities))
            .Concat(Tests(limits.TestOverdue.Tests));

    private static IEnumerable<Pair> Pairs(RuleLimits limits) =>
    [
        AtMost("load_ratio.return", limits.LoadRatio.Return, "raise", limits.LoadRatio.Raise),
        AtMost("weekly_jump.return", limits.WeeklyJump.Return, "raise", limits.WeeklyJump.Raise),
        AtMost("weekly_jump.weeks", limits.WeeklyJump.Weeks, "look_back_weeks", limits.WeeklyJump.LookBackWeeks),
        AtLeast("session_spike.run_warning", limits.SessionSpike.RunWarning, "run_notice", limits.SessionSpike.RunNotice),
        AtLeast("session_spike.load_warning", limits.SessionSpike.LoadWarning, "load_notice", limits.SessionSpike.LoadNotice),
        AtMost("monotony.return", limits.Monotony.Return, "raise", limits.Monotony.Raise),
        AtMost("monotony.strains_wanted", limits.Monotony.StrainsWanted, "look_back_days", limits.Monotony.LookBackDays),
        AtMost("hard_days.return_factor", limits.HardDays.ReturnFactor, "median_factor", limits.HardDays.MedianFactor),
        AtMost("hard_days.training_days_wanted", limits.HardDays.TrainingDaysWanted, "look_back_days", limits.HardDays.LookBackDays),
        AtMost("hard_days.matches", limits.HardDays.Matches, "match_days", limits.HardDays.MatchDays),
        Below("hard_days.matches_return", limits.HardDays.MatchesReturn, "matches", limits.HardDays.Matches),
        AtMost("falling_load.warning", limits.FallingLoad.Warning, "notice", limits.FallingLoad.Notice),
        AtLeast("falling_load.return", limits.FallingLoad.Return, "notice", limits.FallingLoad.Notice),
        AtMost("falling_load.weeks_wanted", limits.FallingLoad.WeeksWanted, "weeks", limits.FallingLoad.Weeks),
        AtLeast("stimulus_gap.warning_days", limits.StimulusGap.WarningDays, "notice_days", limits.StimulusGap.NoticeDays),
        Below("not_usable.return_sessions", limits.NotUsable.ReturnSessions, "sessions", limits.NotUsable.Sessions),
        new("silence.gaps_wanted", limits.Silence.GapsWanted, limits.Silence.LookBackDays, FormattableString.Invariant(
            $"{limits.Silence.GapsWanted} gaps never fit in look_back_days, which is {limits.Silence.LookBackDays}")),
    ];

    private static Pair AtMost(string path, double value, string other, double bound) =>
        new(path, value, bound, FormattableString.Invariant($"{value} is above {other}, which is {bound}"));

    private static Pair Below(string path, int value, string other, int bound) =>
        new(path, value, bound - 1, FormattableString.Invariant($"{value} is not below {other}, which is {bound}"));

    private static Pair AtLeast(string path, double value, string other, double bound) =>
        new(path, bound, value, FormattableString.Invariant($"{value} is below {other}, which is {bound}"));

    private static IEnumerable<(string Path, string Reason)> Tests(IReadOnlyList<string> tests) => tests
        .Select((word, place) => (word, place))
        .Where(test => FunctionTests.Of(test.word) is null)
        .Select(test => ($"test_overdue.tests[{test.place}]", $"\"{test.word}\" is not a function test{Nearest.Hint(test.word, FunctionTests.All.Select(known => known.Word))}"));

    private static IEnumerable<(string Path, string Reason)> Names(string rule, IReadOnlyList<string> quantities)
    {
        foreach (var (name, place) in quantities.Select((name, place) => (name, place)))
        {
            var reason = IsTop(name) ? "is no load: a day's sum of it would mean nothing"
                : IsName(name) ? null
                : "is not the name of a quantity: a small letter, then small letters, digits and _, 60 at most";
            if (reason is not null)
            {
                yield return ($"{rule}.quantities[{place}]", $"\"{name}\" {reason}");
            }
        }
    }

    /// <summary>Shown by session, never summed over a day.</summary>
    private static bool IsTop(string name) =>
        name is QuantityNames.SpeedTop or QuantityNames.SpeedTopShare or QuantityNames.PowerTop or QuantityNames.Rating
        || name.StartsWith(QuantityNames.OneRepetitionMaxOf, StringComparison.Ordinal);

    private static bool IsName(string name) =>
        name.Length is > 0 and <= LongestName
        && char.IsAsciiLetterLower(name[0])
        && name.All(letter => char.IsAsciiLetterLower(letter) || char.IsAsciiDigit(letter) || letter == '_');

    /// <summary>Two limits of which the first may not exceed the second.</summary>
    private sealed record Pair(string Path, double Low, double High, string Reason);
}
