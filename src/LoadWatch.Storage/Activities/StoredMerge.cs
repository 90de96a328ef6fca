using LoadWatch.Activities;
using NodaTime;

namespace LoadWatch.Storage.Activities;

/// <summary>How an activity was made of its recordings.</summary>
/// <param name="Winner">The recording that it is named by.</param>
/// <param name="Contributions">What each of its recordings gives, the winner's first.</param>
public sealed record StoredMerge(RecordingSummary Winner, SessionFrame Frame, IReadOnlyList<Contribution> Contributions)
{
    /// <summary>That of a recording alone.</summary>
    public static StoredMerge Of(RecordingSummary alone) =>
        new(alone, SessionFrame.Of(alone), [new Contribution(alone.Key, ContributionRole.Wins, null) { Source = alone.Source }]);

    public static StoredMerge Of(SessionPlan plan) => new(plan.Winner, plan.Frame, plan.Contributions);

    /// <summary>The winner with what all recordings together say of the session.</summary>
    public RecordingSummary Session => Winner with
    {
        Start = Frame.Start,
        ElapsedSeconds = Frame.ElapsedSeconds,
        TimerSeconds = Frame.TimerSeconds,
        Sport = Frame.Sport,
        Sets = Frame.Sets,
        DistanceMetres = Frame.DistanceMetres,
    };

    /// <summary>The local date that the session counts for.</summary>
    public LocalDate Date => Session.Date;
}
