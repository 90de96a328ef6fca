using System.Globalization;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>The line that is read in five seconds, without names. Quiet is said only where everybody is known and nothing waits for an answer.</summary>
internal sealed record FirstLine(IReadOnlyList<BriefSubject> Shown, LocalDate? UpTo, IReadOnlyList<BriefLine> Questions, bool Self)
{
    /// <summary>Those to act on; null where the brief does not tell of them.</summary>
    public IReadOnlyList<BriefSubject>? Flagged { get; init; }

    /// <summary>People whose silence is told in common.</summary>
    public int Silent { get; init; }

    /// <summary>Null where the contact is not asked to call.</summary>
    public CallList? Calls { get; init; }

    /// <summary>Whether the week is told.</summary>
    public bool HasWeek { get; init; }

    /// <summary>Null where no sheets are wanted.</summary>
    public IReadOnlyList<ClassSheet>? Sheets { get; init; }

    public string Write()
    {
        var sentences = new[]
        {
            CallsComeFirst ? OfCalls(Calls!) : null,
            Flagged is null ? null : OfFlagged(Flagged),
            Sheets is null ? null : OfSheets(Sheets),
            Calls is null || CallsComeFirst ? null : OfCalls(Calls),
            HasWeek && Flagged is null ? $"The week of {People(Shown.Count)}." : null,
            Flagged is null ? null : SeenEarlier(),
            Flagged is null ? null : Planned(),
            Flagged is null || NothingIsKnown ? null : Unseen(),
            OfQuestions(),
            Questions.Any(line => line.OfDelivery) ? "Notices did not get through." : null,
        };
        return string.Join(' ', sentences.OfType<string>().DefaultIfEmpty("Nothing is to be told today."));
    }

    /// <summary>Nobody has a known day: nothing can be said, and quiet would be wrong (I-6).</summary>
    public bool NothingIsKnown => Shown.Count > 0 && Shown.All(subject => PersonNotes.LastRecorded(subject) is null && subject.Days.All(day => day.Load is null));

    /// <summary>It tells of people without a known day in the last week.</summary>
    public bool SomeAreUnknown => Flagged is not null && UnseenCount > 0;

    private int Asked => Questions.Count(line => !line.OfDelivery);

    private string OfFlagged(IReadOnlyList<BriefSubject> flagged) => (Shown.Count, flagged.Count) switch
    {
        (0, _) => "Nobody is in this brief yet.",
        (_, > 0) when Self => $"To look at: {PersonSentence.Listed([.. BriefBuilder.Active(flagged[0]).Select(news => RuleTexts.Named(news.Alert.Key, self: true))])}.",
        (_, > 0) when Silent > 0 => $"Recordings of {Silent} of {Shown.Count} do not come in; {flagged.Count} more to look at: {string.Join(", ", Counts(flagged))}.",
        (_, > 0) => $"{flagged.Count} of {Shown.Count} to look at: {string.Join(", ", Counts(flagged))}.",
        _ when NothingIsKnown && Self => "Nothing is known yet: no recording has come in.",
        _ when NothingIsKnown => $"Nothing is known yet: no recording of {People(Shown.Count)} has come in.",
        _ when Silent > 0 => $"Recordings of {Silent} of {Shown.Count} do not come in; nothing else to act on.",
        _ when Self => IsOpen ? $"Nothing to act on{But}." : "All quiet: nothing to act on.",
        _ when CallsComeFirst => $"Nothing else to act on for {People(Shown.Count)}{But}.",
        _ => IsOpen ? $"Nothing to act on for {People(Shown.Count)}{But}." : $"All quiet: {People(Shown.Count)}, nothing to act on.",
    };

    /// <summary>Somebody to call is something to act on: where it is all there is, it stands large.</summary>
    private bool CallsComeFirst => Calls?.Calls.Count > 0 && Flagged is { Count: 0 } && Shown.Count > 0 && !NothingIsKnown && Silent == 0;

    /// <summary>The questions belong to the sentence that stands large where it has nothing else to say.</summary>
    private string But => Asked == 0 ? "" : $", but {InWords(Asked)}";

    private bool IsAskedAbove => Flagged is { Count: 0 } && Shown.Count > 0 && !NothingIsKnown && Silent == 0;

    /// <summary>Something is unknown, waits for an answer, or somebody is to be called.</summary>
    private bool IsOpen => Questions.Count > 0 || UnseenCount > 0 || Calls?.Calls.Count > 0;

    private static string OfSheets(IReadOnlyList<ClassSheet> sheets)
    {
        var people = sheets.SelectMany(sheet => sheet.People).DistinctBy(person => person.PersonId, StringComparer.Ordinal).ToList();
        var away = people.Count(person => person.IsAway);
        var sessions = sheets.Count == 1 ? "" : $" in {sheets.Count} sessions";
        return people.Count == 0 ? "No session is planned today." : $"{People(people.Count)} planned today{sessions}{(away == 0 ? "" : $", {away} of them away")}.";
    }

    private static string OfCalls(CallList calls) => (calls.Calls.Count, calls.Beyond) switch
    {
        (0, _) => "Nobody to call.",
        (var count, 0) => $"{People(count)} to call.",
        var (count, beyond) => $"{People(count)} to call, and {beyond} more with a reason.",
    };

    /// <summary>Each person once, under the gravest reason, so that the counts add up.</summary>
    private static IEnumerable<string> Counts(IReadOnlyList<BriefSubject> flagged) => flagged
        .Select(subject => BriefBuilder.Active(subject).First().Alert.Key)
        .GroupBy(key => RuleTexts.Counted(key), StringComparer.Ordinal)
        .OrderBy(group => RuleTexts.Order(group.First().Rule))
        .ThenBy(group => group.First().Region)
        .ThenBy(group => group.Key, StringComparer.Ordinal)
        .Select(group => $"{group.Count()} {group.Key}");

    private string? Planned() =>
        !Self && UpTo is { } last && PlannedPresence.Of(Shown, last) is { } session
            ? $"{session.In} of {session.Expected} recordings of the session of {session.Date.ToString("d MMMM", CultureInfo.InvariantCulture)} are in{(session.NotYet == 0 ? "" : $", {session.NotYet} not in yet")}."
            : null;

    private string? SeenEarlier()
    {
        var seen = Shown.Count(subject => subject.Alerts.Any(BriefBuilder.IsActive) && !BriefBuilder.ToLookAt(subject));
        return (seen, Self) switch
        {
            (0, _) => null,
            (_, true) => "What you have seen before still stands.",
            _ => $"What was seen before still stands for {People(seen)}.",
        };
    }

    /// <summary>Quiet without data is not quiet: who is not flagged and has no known day in the last 7 is counted (I-6).</summary>
    private string? Unseen() => (UnseenCount, Self) switch
    {
        (0, _) => null,
        (_, true) => "No day of the last week is known.",
        (var unseen, _) => $"{People(unseen)} without a known day in the last week.",
    };

    private int UnseenCount => Shown.Count(subject => !subject.Alerts.Any(BriefBuilder.IsActive) && !IsKnownLately(subject));

    private bool IsKnownLately(BriefSubject subject) =>
        UpTo is { } last && subject.Days.Any(day => day.Load is not null && day.Date > last.PlusDays(-7) && day.Date <= last);

    private string? OfQuestions() => Asked == 0 || IsAskedAbove ? null : $"{InWords(Asked)}.";

    private static string InWords(int questions) => questions == 1 ? "1 question needs an answer" : $"{questions} questions need an answer";

    private static string People(int count) => count == 1 ? "1 person" : $"{count} people";
}
