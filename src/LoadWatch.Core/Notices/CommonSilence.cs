using LoadWatch.Alerts;
using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>
/// Many people silent at once have one cause: an upload, an inbox, a night without power. It is named first, in one line, and nobody is flagged for it alone.
/// </summary>
internal static class CommonSilence
{
    private const string Rule = "silence";

    /// <summary>So many of a group, and half of it, are no coincidence. A choice.</summary>
    internal const int Fewest = 5;

    internal const int WithinDays = 3;

    /// <summary>The people whose silence is told in common, group by group: many at once, and whoever's inbox is away, which explains it.</summary>
    public static IReadOnlyList<BriefSubject> Of(IReadOnlyList<BriefSubject> shown) =>
    [
        .. shown
            .GroupBy(subject => subject.Group.Id, StringComparer.Ordinal)
            .SelectMany(group => AtOnce([.. group]).Union(group.Where(subject => subject.InboxIsAway && IsSilent(subject)))),
    ];

    /// <summary>The largest number of people whose last recordings lie within three days: who stopped weeks apart has a cause of their own.</summary>
    private static IReadOnlyList<BriefSubject> AtOnce(IReadOnlyList<BriefSubject> group)
    {
        var silent = group.Where(IsSilent).Select(subject => (Subject: subject, Last: LastRecorded(subject))).OrderBy(one => one.Last).ToList();
        var together = silent
            .Select(first => silent.FindAll(one => one.Last >= first.Last && one.Last <= first.Last.PlusDays(WithinDays)))
            .MaxBy(those => those.Count) ?? [];
        return together.Count >= Fewest && 2 * together.Count >= group.Count ? [.. together.Select(one => one.Subject)] : [];
    }

    private static LocalDate LastRecorded(BriefSubject subject) =>
        PersonNotes.LastRecorded(subject) ?? LocalDate.MinIsoValue.PlusDays(1);

    /// <summary>Whether silence is the only reason to look at somebody.</summary>
    public static bool IsOnlySilent(BriefSubject subject) => BriefBuilder.Active(subject).All(news => news.Alert.Key.Rule == Rule);

    /// <summary>One line a group, to stand before all questions.</summary>
    public static IEnumerable<BriefLine> Lines(IReadOnlyList<BriefSubject> shown, IReadOnlyList<BriefSubject> silent) => silent
        .GroupBy(subject => subject.Group.Id, StringComparer.Ordinal)
        .Select(group => new BriefLine(
            group.First().Group.Name,
            $"recordings of {group.Count()} of {shown.Count(subject => subject.Group.Id == group.Key)} people do not come in: one upload, inbox or charger may be the cause, so they are not named one by one"));

    private static bool IsSilent(BriefSubject subject) =>
        subject.Alerts.Any(news => news.Alert.Key.Rule == Rule && news.Alert.IsTold);
}
