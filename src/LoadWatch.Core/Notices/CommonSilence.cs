using LoadWatch.Alerts;

namespace LoadWatch.Notices;

/// <summary>
/// Many people silent at once have one cause: an upload, an inbox, a night without power. It is named first, in one line, and nobody is flagged for it alone.
/// </summary>
internal static class CommonSilence
{
    private const string Rule = "silence";

    /// <summary>So many of a group, and half of it, are no coincidence. A choice.</summary>
    private const int Fewest = 5;

    /// <summary>The people whose silence is told in common, group by group: many of it, or all of it while an inbox is away, which explains any silence.</summary>
    public static IReadOnlyList<BriefSubject> Of(IReadOnlyList<BriefSubject> shown, bool inboxIsAway) =>
    [
        .. shown
            .GroupBy(subject => subject.Group.Id, StringComparer.Ordinal)
            .Select(group => (All: group.Count(), Silent: group.Where(IsSilent).ToList()))
            .Where(group => inboxIsAway || (group.Silent.Count >= Fewest && 2 * group.Silent.Count >= group.All))
            .SelectMany(group => group.Silent),
    ];

    /// <summary>Whether silence is the only reason to look at somebody.</summary>
    public static bool IsOnlySilent(BriefSubject subject) => BriefBuilder.Active(subject).All(news => news.Alert.Key.Rule == Rule);

    /// <summary>One line a group, to stand before all questions.</summary>
    public static IEnumerable<BriefLine> Lines(IReadOnlyList<BriefSubject> shown, IReadOnlyList<BriefSubject> silent) => silent
        .GroupBy(subject => subject.Group.Id, StringComparer.Ordinal)
        .Select(group => new BriefLine(
            group.First().Group.Name,
            $"recordings of {group.Count()} of {shown.Count(subject => subject.Group.Id == group.Key)} people do not come in: one upload, inbox or charger may be the cause, so they are not named one by one"));

    private static bool IsSilent(BriefSubject subject) =>
        subject.Alerts.Any(news => news.Alert.Key.Rule == Rule && AlertLife.IsActive(news.Alert.State) && news.Alert.ShelvedUntil is null);
}
