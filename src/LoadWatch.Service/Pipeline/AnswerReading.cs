using System.Globalization;
using LoadWatch.Alerts;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Rows;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Rows;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Pipeline;

/// <summary>What one row of answers asks for, seen from what is stored.</summary>
internal sealed class AnswerReading(WorkingConfiguration configuration, StoreSession session, Instant now)
{
    private static readonly LocalDatePattern DayAndMonth = LocalDatePattern.Create("d MMMM", CultureInfo.InvariantCulture);

    /// <summary>The decisions that the row still wants, or why it cannot be followed.</summary>
    /// <param name="kept">Those that it has made and that are in force.</param>
    public (IReadOnlyList<Decision> Wanted, BriefLine? Question) Of(StoredRow row, IReadOnlyList<Decision> kept)
    {
        var answer = (AnswerRow)row.Content;
        if (KindOf(answer.Word) is { } kind)
        {
            return kept.Count > 0 ? ([], null) : OfDates(row, answer, kind);
        }

        return answer.Word switch
        {
            AnswerWord.BelongsTo => kept.Count > 0 ? ([], null) : OfFile(row, answer),
            AnswerWord.Shelve when WrongUntil(row, answer) is { } reason => ([], Question(row, reason)),
            _ => OfAlerts(row, answer, kept),
        };
    }

    /// <summary>Whether a decision that a row made is what it says now. While the row is the one that it was made by, whom and what it meant is not asked again.</summary>
    public bool StillSays(StoredRow row, Decision decision)
    {
        var answer = (AnswerRow)row.Content;
        return Decided(row, answer, decision.Kind, decision.Subject, decision.Person) with { Made = decision.Made } == decision
            && decision.Kind == (KindOf(answer.Word) ?? OtherKind(answer.Word))
            && (decision.Made >= row.Since || IsMeant(row, answer, decision));
    }

    private bool IsMeant(StoredRow row, AnswerRow answer, Decision decision)
    {
        var person = configuration.Subjects.Of(row)?.Any(person => person.Id == decision.Person) == true;
        return person && decision.Kind switch
        {
            DecisionKind.Assign => MeantFile.Refusal(session, answer.File ?? "", out var file) is null && file!.Sha == decision.Subject,
            DecisionKind.Acknowledge or DecisionKind.Shelve => session.Alerts.Get(decision.Subject) is { } alert && IsOfRule(alert, answer),
            _ => true,
        };
    }

    private (IReadOnlyList<Decision>, BriefLine?) OfDates(StoredRow row, AnswerRow answer, DecisionKind kind)
    {
        if (answer.Until < row.Date)
        {
            return ([], Question(row, "its last date lies before its first"));
        }

        return configuration.Subjects.Of(row) is { } people
            ? ([.. people.Select(person => Decided(row, answer, kind, person.Id, person.Id))], null)
            : ([], NobodyMeant(row));
    }

    private (IReadOnlyList<Decision>, BriefLine?) OfFile(StoredRow row, AnswerRow answer)
    {
        if (configuration.Subjects.FindGroup(row.Subject) is not null && row.Person is null)
        {
            return ([], Question(row, "a file belongs to one person, not to a group"));
        }

        if (configuration.Subjects.Of(row) is not [var owner])
        {
            return ([], NobodyMeant(row));
        }

        return MeantFile.Refusal(session, answer.File ?? "", out var file) is { } refusal
            ? ([], Question(row, refusal))
            : ([Decided(row, answer, DecisionKind.Assign, file!.Sha, owner.Id)], null);
    }

    private (IReadOnlyList<Decision>, BriefLine?) OfAlerts(StoredRow row, AnswerRow answer, IReadOnlyList<Decision> kept)
    {
        if (configuration.Subjects.Of(row) is not { } people)
        {
            return ([], kept.Count > 0 ? null : NobodyMeant(row));
        }

        var kind = OtherKind(answer.Word);
        var done = kept.Select(decision => decision.Subject).ToHashSet(StringComparer.Ordinal);
        return ([.. people
            .SelectMany(person => session.Alerts.Open(person.Id).Where(alert => IsOfRule(alert, answer) && !done.Contains(alert.Id) && WasKnown(alert, row, person)))
            .Where(alert => kind == DecisionKind.Shelve ? IsShelvable(alert, answer) : !AlertLife.IsAcknowledged(alert.State))
            .Select(alert => Decided(row, answer, kind, alert.Id, alert.Key.Person))], null);
    }

    private static bool IsOfRule(Alert alert, AnswerRow answer) => answer.Rule is null || alert.Key.Rule == answer.Rule;

    private bool IsShelvable(Alert alert, AnswerRow answer) =>
        AlertLife.IsActive(alert.State) && answer.Until >= DecisionEffects.Today(configuration, alert.Key.Person, now);

    /// <summary>
    /// Raised, or risen, on the row's date or before, and told before the row came: a date is evaluated on the day after it, so a row that came on a day can
    /// only mean earlier dates.
    /// </summary>
    private bool WasKnown(Alert alert, StoredRow row, Person person)
    {
        var raised = session.Alerts.Changes.Of(alert.Id)
            .Where(change => change.Reason is AlertChangeReason.Raised or AlertChangeReason.RaisedAgain or AlertChangeReason.SeverityRose)
            .Max(change => change.Date);
        return raised <= row.Date && raised < PersonDay.On(row.Since, person);
    }

    private static string? WrongUntil(StoredRow row, AnswerRow answer) => answer.Until switch
    {
        null => "shelve wants a last date (until)",
        { } until when until < row.Date => "its last date lies before its first",
        { } until when until > row.Date.PlusDays(AlertReview.LongestShelvingDays) => $"shelved for more than {AlertReview.LongestShelvingDays} days",
        _ => null,
    };

    private Decision Decided(StoredRow row, AnswerRow answer, DecisionKind kind, string subject, string person)
    {
        var said = new Circumstances(now, answer.By, answer.Note);
        var hasDates = kind is not (DecisionKind.Acknowledge or DecisionKind.Assign);
        return new Decision(kind, subject, person, now, said.By, said.Note)
        {
            From = hasDates ? row.Date : null,
            Until = hasDates && kind != DecisionKind.Returning ? answer.Until : null,
            Via = Decision.ViaRow(row.Scope, row.Subject, row.Key),
        };
    }

    private BriefLine NobodyMeant(StoredRow row) => Question(
        row,
        (row.Person ?? row.Subject) is { Length: > 0 } word
            ? $"\"{word}\" is no person and no group of the roster{Nearest.Hint(word, configuration.People.Keys.Concat(configuration.Groups.Keys))}"
            : "it names no person and no group");

    private static BriefLine Question(StoredRow row, string reason) =>
        new(NameOf(row.Scope), $"the answer of {DayAndMonth.Format(row.Date)}{(row.Subject.Length > 0 ? $" about {row.Subject}" : "")} is not followed: {reason}");

    /// <summary>The table as its inbox names it.</summary>
    private static string NameOf(string scope) => scope[(scope.IndexOf('/', StringComparison.Ordinal) + 1)..].Split('|')[0];

    private static DecisionKind OtherKind(AnswerWord word) => word switch
    {
        AnswerWord.Seen => DecisionKind.Acknowledge,
        AnswerWord.Shelve => DecisionKind.Shelve,
        _ => DecisionKind.Assign,
    };

    /// <summary>For words about a person's dates, else null.</summary>
    private static DecisionKind? KindOf(AnswerWord word) => word switch
    {
        AnswerWord.Ill => DecisionKind.Ill,
        AnswerWord.Injured => DecisionKind.Injured,
        AnswerWord.Away => DecisionKind.Away,
        AnswerWord.Returning => DecisionKind.Returning,
        AnswerWord.Rest => DecisionKind.Rest,
        AnswerWord.Match => DecisionKind.Match,
        _ => null,
    };
}
