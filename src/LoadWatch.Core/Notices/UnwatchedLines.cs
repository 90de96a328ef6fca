using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>
/// What no rule looks at in a group, so that quiet is not taken for watched: rules that limits turn off, planned states that mute some, and legs that no channel sees. Who is away, or lacks known
/// days, is told in the own row.
/// </summary>
internal static class UnwatchedLines
{
    /// <summary>Beyond so many, people are counted.</summary>
    private const int NamesAtMost = 3;

    /// <summary>Whose last recording is older is told as silent.</summary>
    private const int LatelyDays = 28;

    private static readonly string[] Reasons = ["by the limits", "while returning", "in a light week", "in the off-season"];

    /// <param name="members">Of one group, by name.</param>
    public static IReadOnlyList<string> Of(IReadOnlyList<BriefSubject> members, LocalDate upTo, RoleView view, bool self) =>
    [
        .. members
            .SelectMany(member => Muted(member, upTo).Select(muted => (Member: member, muted.Why, Rules: Listed(muted.Rules, view))))
            .Where(one => one.Rules.Length > 0)
            .GroupBy(one => (one.Why, one.Rules))
            .OrderBy(same => Array.IndexOf(Reasons, same.Key.Why)).ThenBy(same => same.Key.Rules, StringComparer.Ordinal)
            .Select(same => $"not watched{Whom([.. same.Select(one => one.Member)], members, self)} {same.Key.Why}: {same.Key.Rules}"),
        .. Unseen(members, upTo) is { Count: > 0 } unseen
            ? [$"leg work cannot be seen{Whom(unseen, members, self)}, so its gaps are not watched: logged sets, or power or running speed with their reference values, would tell"]
            : Array.Empty<string>(),
    ];

    private static IEnumerable<(string Why, IEnumerable<string> Rules)> Muted(BriefSubject member, LocalDate upTo)
    {
        yield return (Reasons[0], RuleBook.All.Where(rule => !rule.LimitsOf(member.Group.Limits).Enabled).Select(rule => rule.Name));
        if (member.Days is not [.., var last] || last.Date != upTo || last.Plan.Absence is not null)
        {
            yield break;
        }

        foreach (var quiet in NotWatched.Of([last], member.Group.Limits).Where(quiet => quiet.State != PlannedState.Absent))
        {
            yield return (While(quiet.State), quiet.Rules);
        }
    }

    private static string While(PlannedState state) => state switch
    {
        PlannedState.Returning => Reasons[1],
        PlannedState.LightWeek => Reasons[2],
        _ => Reasons[3],
    };

    private static string Listed(IEnumerable<string> rules, RoleView view) => string.Join(", ", rules.Where(view.ShowsRule).Select(rule => rule.Replace('_', ' ')));

    /// <summary>Somebody who trains, and of whose legs nothing has ever been known. A young record says so in its own row.</summary>
    private static List<BriefSubject> Unseen(IReadOnlyList<BriefSubject> members, LocalDate upTo) =>
    [
        .. members.Where(member => member.Group.Limits is { StimulusGap.Enabled: true } or { StimulusLow.Enabled: true }
            && member.Days is [.., var last] && last.Date == upTo && last.Plan.Absence is null
            && last.Regions.GetValueOrDefault(BodyRegion.Legs, RegionDay.NotCovered).DaysSince is null
            && member.Days.Count(day => day.State == DayState.Recorded) >= BriefRows.UnseenFrom && !BriefRows.IsFirstUnseen(member, last)
            && PersonNotes.LastRecorded(member) > upTo.PlusDays(-LatelyDays)),
    ];

    /// <summary>Nothing where it is so of all of several, or of the reader.</summary>
    private static string Whom(IReadOnlyList<BriefSubject> whom, IReadOnlyList<BriefSubject> members, bool self) => whom.Count switch
    {
        _ when self || whom.Count == members.Count => "",
        <= NamesAtMost => $" for {PersonSentence.Listed([.. whom.Select(subject => BriefBuilder.NameOf(subject.Person, self: false))])}",
        var count => $" for {count} of {members.Count}",
    };
}
