using LoadWatch.Alerts;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Appends decisions with what they change at once, for commands and answers alike: the alert with its history, the dates to compute again, the audit. Whose
/// a file is takes effect with the next look at it (<see cref="Arrivals.AssignedFiles"/>).
/// </summary>
public sealed class DecisionEffects(WorkingConfiguration configuration, StoreSession session)
{
    /// <summary>False, with nothing written, where a decision about an alert would change nothing or there is no such alert.</summary>
    public bool Make(Decision decision)
    {
        if (decision.Kind is DecisionKind.Acknowledge or DecisionKind.Shelve)
        {
            if (session.Alerts.Get(decision.Subject) is not { } alert || !Apply(Review(decision, alert)))
            {
                return false;
            }
        }

        session.Decisions.Add(decision);
        MarkDirty(decision);
        session.Audits.Add(Done(decision.Kind), Detail(decision), decision.Made);
        return true;
    }

    /// <summary>Takes a decision back: it is no longer in force. What somebody has seen stays seen.</summary>
    /// <param name="via">As <see cref="Decision.Via"/>.</param>
    public void Withdraw(Decision decision, Instant made, string? via)
    {
        session.Decisions.Add(new Decision(DecisionKind.Withdraw, decision.Id, decision.Person, made, By: null, Note: null) { Via = via });
        MarkDirty(decision);
        session.Audits.Add(Done(DecisionKind.Withdraw), decision.Id, made);
        if (decision.Kind == DecisionKind.Shelve && session.Alerts.Get(decision.Subject) is { ShelvedUntil: not null } alert)
        {
            Apply(Reconsider(alert, made));
        }
    }

    /// <summary>The person's own date at a moment.</summary>
    public static LocalDate Today(WorkingConfiguration configuration, string person, Instant now) =>
        configuration.People.TryGetValue(person, out var known) ? PersonDay.On(now, known) : now.InUtc().Date;

    private AlertReviewResult Review(Decision decision, Alert alert)
    {
        var today = Today(configuration, alert.Key.Person, decision.Made);
        return decision.Kind == DecisionKind.Acknowledge
            ? AlertReview.Acknowledge(alert, today, LastSequence)
            : AlertReview.Shelve(alert, decision.Until!.Value, today, LastSequence);
    }

    /// <summary>What shelves it now that one of several decisions is gone.</summary>
    private AlertReviewResult Reconsider(Alert alert, Instant made)
    {
        var today = Today(configuration, alert.Key.Person, made);
        var left = DecisionTable.InForce(session.Decisions.OfAlert(alert.Id)).LastOrDefault(decision => decision.Kind == DecisionKind.Shelve && decision.Until >= today);
        return left is { Until: { } until } ? AlertReview.Shelve(alert, until, today, LastSequence) : AlertReview.Unshelve(alert, today, LastSequence);
    }

    private bool Apply(AlertReviewResult review)
    {
        foreach (var changed in review.Alerts.Where(_ => review.Changes.Count > 0))
        {
            session.Alerts.Put(changed);
        }

        foreach (var change in review.Changes)
        {
            session.Alerts.Changes.Append(change);
        }

        return review.Changes.Count > 0;
    }

    private int LastSequence(string alert) => session.Alerts.Changes.NextSequence(alert) - 1;

    /// <summary>What is said of a person's dates changes the days from the first of them on.</summary>
    private void MarkDirty(Decision decision)
    {
        if (decision.Subject == decision.Person && decision.From is { } from && configuration.People.ContainsKey(decision.Person))
        {
            session.People.MarkDirty(decision.Person, from);
        }
    }

    private static string Detail(Decision decision) => decision.Kind == DecisionKind.Assign ? $"{decision.Subject[..12]} to {decision.Person}" : decision.Subject;

    private static string Done(DecisionKind kind) => kind switch
    {
        DecisionKind.Acknowledge => "acknowledged",
        DecisionKind.Assign => "assigned",
        DecisionKind.Shelve => "shelved",
        DecisionKind.Withdraw => "withdrawn",
        _ => Words.Of(kind),
    };
}
