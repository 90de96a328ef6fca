using System.Globalization;
using LoadWatch.Alerts;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Asks once a week, in the contact's first brief of it, about alerts that have stood for long without anybody having seen them.</summary>
internal static class UnseenAlerts
{
    /// <summary>Those that one brief names, the longest first; the rest is counted.</summary>
    private const int NamedAtMost = 5;

    public static IReadOnlyList<BriefLine> Lines(Contact contact, LocalDate date, IReadOnlyList<BriefSubject> shown, bool self)
    {
        if (contact.BriefDays.Count == 0 || date.DayOfWeek != contact.BriefDays.Min())
        {
            return [];
        }

        var stale = shown
            .SelectMany(subject => subject.Alerts.Where(news => StaleAlerts.IsStale(news.Alert, date)).Select(news => (subject.Person, news.Alert)))
            .OrderBy(one => one.Alert.StandsSince)
            .ThenBy(one => one.Alert.Id, StringComparer.Ordinal)
            .ToList();
        var named = stale.Take(NamedAtMost).Select(one => new BriefLine(
            BriefBuilder.NameOf(one.Person, self),
            $"{RuleTexts.Named(one.Alert.Key, self)} since {Since(one.Alert.StandsSince, date)}, and nobody has said that it was seen: answer \"seen\", or shelve it"));
        return stale.Count > NamedAtMost
            ? [.. named, new BriefLine("Standing alerts", FormattableString.Invariant($"{stale.Count - NamedAtMost} more have stood for over {StaleAlerts.Days} days, and nobody has said that they were seen"))]
            : [.. named];
    }

    private static string Since(LocalDate since, LocalDate date) => since.ToString(since.Year == date.Year ? "d MMMM" : "d MMMM uuuu", CultureInfo.InvariantCulture);
}
