using System.Globalization;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>The line that is read in five seconds, without names.</summary>
internal static class FirstLine
{
    /// <param name="shown">Everybody in the brief.</param>
    /// <param name="flagged">Those to act on.</param>
    /// <param name="silent">People whose silence is told in common.</param>
    /// <param name="upTo">The last date looked at.</param>
    /// <param name="questions">Things that need an answer.</param>
    public static string Of(
        IReadOnlyList<BriefSubject> shown, IReadOnlyList<BriefSubject> flagged, int silent, LocalDate? upTo, IReadOnlyList<BriefLine> questions, bool self)
    {
        var sentences = new[]
        {
            self ? OfOne(shown[0], flagged.Count > 0) : OfMany(shown.Count, flagged, silent),
            SeenEarlier(shown, self),
            Planned(shown, upTo, self),
            Unseen(shown, upTo, self),
            Questions(questions.Count(line => !line.OfDelivery)),
            questions.Any(line => line.OfDelivery) ? "Notices did not get through." : null,
        };
        return string.Join(' ', sentences.Where(sentence => sentence is not null));
    }

    private static string OfOne(BriefSubject subject, bool flagged) => flagged
        ? $"To look at: {string.Join("; ", BriefBuilder.Active(subject).Select(news => RuleTexts.Named(news.Alert.Key, self: true)))}."
        : "All quiet: nothing to act on.";

    private static string OfMany(int people, IReadOnlyList<BriefSubject> flagged, int silent) => (people, flagged.Count) switch
    {
        (0, _) => "Nobody is in this brief yet.",
        (_, 0) when silent > 0 => $"Recordings of {silent} of {people} do not come in; nothing else to act on.",
        (_, 0) => $"All quiet: {People(people)}, nothing to act on.",
        _ => $"{flagged.Count} of {people} to look at: {string.Join(", ", Counts(flagged))}.",
    };

    /// <summary>Each person once, under the gravest reason, so that the counts add up.</summary>
    private static IEnumerable<string> Counts(IReadOnlyList<BriefSubject> flagged) => flagged
        .Select(subject => BriefBuilder.Active(subject).First().Alert.Key)
        .GroupBy(key => RuleTexts.Counted(key), StringComparer.Ordinal)
        .OrderBy(group => RuleTexts.Order(group.First().Rule))
        .ThenBy(group => group.First().Region)
        .ThenBy(group => group.Key, StringComparer.Ordinal)
        .Select(group => $"{group.Count()} {group.Key}");

    private static string? Planned(IReadOnlyList<BriefSubject> shown, LocalDate? upTo, bool self) =>
        !self && upTo is { } last && PlannedPresence.Of(shown, last) is { } session
            ? $"{session.In} of {session.Expected} recordings of the session of {session.Date.ToString("d MMMM", CultureInfo.InvariantCulture)} are in."
            : null;

    private static string? SeenEarlier(IReadOnlyList<BriefSubject> shown, bool self)
    {
        var seen = shown.Count(subject => subject.Alerts.Any(BriefBuilder.IsActive) && !BriefBuilder.ToLookAt(subject));
        return (seen, self) switch
        {
            (0, _) => null,
            (_, true) => "What you have seen before still stands.",
            _ => $"What was seen before still stands for {People(seen)}.",
        };
    }

    /// <summary>Quiet without data is not quiet: who is not flagged and has no known day in the last 7 is counted (I-6).</summary>
    private static string? Unseen(IReadOnlyList<BriefSubject> shown, LocalDate? upTo, bool self)
    {
        var unseen = shown.Count(subject => !subject.Alerts.Any(BriefBuilder.IsActive) && !IsKnownLately(subject, upTo));
        return (unseen, self) switch
        {
            (0, _) => null,
            (_, true) => "No day of the last week is known.",
            _ => $"{People(unseen)} without a known day in the last week.",
        };
    }

    private static bool IsKnownLately(BriefSubject subject, LocalDate? upTo) =>
        upTo is { } last && subject.Days.Any(day => day.Load is not null && day.Date > last.PlusDays(-7) && day.Date <= last);

    private static string? Questions(int count) => count switch
    {
        0 => null,
        1 => "1 question needs an answer.",
        _ => $"{count} questions need an answer.",
    };

    private static string People(int count) => count == 1 ? "1 person" : $"{count} people";
}
