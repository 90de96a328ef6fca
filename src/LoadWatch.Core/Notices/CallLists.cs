using LoadWatch.Alerts;
using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Chooses whom to call: too long without heavy or fast work, stopped coming, a test that fell. Whoever is acknowledged is in somebody's hands already.</summary>
internal static class CallLists
{
    private static readonly string[] Rules = ["stimulus_gap", "silence", FunctionTestRule.RuleName];

    /// <param name="shown">With the alerts that the reader's role may see.</param>
    /// <param name="silent">People whose silence has a common cause: it is no reason to call them.</param>
    /// <param name="date">The contact's date.</param>
    /// <param name="upTo">The last date looked at.</param>
    /// <param name="atMost">How many may be named.</param>
    public static CallList Of(IReadOnlyList<BriefSubject> shown, IReadOnlyCollection<BriefSubject> silent, LocalDate date, LocalDate upTo, int atMost)
    {
        var together = silent.Select(subject => subject.Person.Id).ToHashSet(StringComparer.OrdinalIgnoreCase);
        var reasons = shown
            .Select(subject => (Subject: subject, Alerts: Reasons(subject, together.Contains(subject.Person.Id)).ToList()))
            .Where(one => one.Alerts.Count > 0 && !PersonNotes.IsAway(one.Subject, date))
            .ToList();
        var called = reasons
            .OrderByDescending(one => one.Alerts.Count)
            .ThenByDescending(one => one.Alerts.Max(news => news.Alert.Severity))
            .ThenBy(one => one.Alerts.Min(news => RuleTexts.Rank(news.Alert.Key.Rule)))
            .Take(atMost)
            .Select(one => one.Subject.Person.Id)
            .ToHashSet(StringComparer.Ordinal);
        return new CallList(
            [.. reasons.Where(one => called.Contains(one.Subject.Person.Id)).Select(one => CallOf(one.Subject, one.Alerts, upTo))],
            Math.Max(0, reasons.Count - atMost));
    }

    /// <summary>Whether nothing else is to be looked at of somebody who is on the list, or counted by it.</summary>
    public static bool IsOnlyToCall(BriefSubject subject, LocalDate date) =>
        !PersonNotes.IsAway(subject, date)
        && BriefBuilder.Active(subject).Where(news => news.Alert.State == AlertState.Unacknowledged).Select(news => news.Alert.Key.Rule) is var rules
        && rules.Any()
        && rules.All(rule => Rules.Contains(rule, StringComparer.Ordinal));

    private static IEnumerable<AlertNews> Reasons(BriefSubject subject, bool inCommon) => BriefBuilder.Active(subject)
        .Where(news => news.Alert.State == AlertState.Unacknowledged && Rules.Contains(news.Alert.Key.Rule, StringComparer.Ordinal) && !(inCommon && news.Alert.Key.Rule == "silence"));

    private static Call CallOf(BriefSubject subject, List<AlertNews> reasons, LocalDate upTo) => new(
        subject.Person.Id,
        BriefBuilder.NameOf(subject.Person, self: false),
        PersonNotes.LastRecorded(subject),
        OneLine.Sentence(string.Join("; ", reasons.Select(news => PersonNotes.Of(news, subject, upTo)).Distinct(StringComparer.Ordinal))));
}
