using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>A planned state of a person's last day, and the rules that it turns off: to be shown, so that quiet is not taken for watched.</summary>
/// <param name="Since">Its first date among the days at hand.</param>
/// <param name="Rules">Names, in the order of <see cref="RuleBook"/>.</param>
public sealed record NotWatched(PlannedState State, LocalDate Since, IReadOnlyList<string> Rules)
{
    /// <summary>By the state that turns each rule off first; empty where every rule that is on is watched.</summary>
    /// <param name="days">Unbroken, oldest first.</param>
    public static IReadOnlyList<NotWatched> Of(IReadOnlyList<Day> days, RuleLimits limits) => days.Count == 0
        ? []
        :
        [
            .. RuleBook.All
                .Where(rule => rule.LimitsOf(limits).Enabled)
                .Select(rule => (rule.Name, State: PlanMutes.Of(rule.Name, days[^1].Plan)))
                .Where(one => one.State is not null)
                .GroupBy(one => one.State!.Value, one => one.Name)
                .OrderBy(state => state.Key)
                .Select(state => new NotWatched(state.Key, FirstOf(days, state.Key), [.. state])),
        ];

    /// <summary><c>not watched (away since 2 March): load ratio, weekly jump</c>.</summary>
    public string Sentence(LocalDate told) =>
        $"not watched ({PlanMutes.Word(State)} since {Wording.Date(Since, told)}): {string.Join(", ", Rules.Select(rule => rule.Replace('_', ' ')))}";

    private static LocalDate FirstOf(IReadOnlyList<Day> days, PlannedState state)
    {
        var first = days.Count - 1;
        while (first > 0 && PlanMutes.Holds(state, days[first - 1].Plan))
        {
            first--;
        }

        return days[first].Date;
    }
}
