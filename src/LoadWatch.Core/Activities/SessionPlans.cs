using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>From the recordings of a person to activities: which are one session, what each of them gives. Needs no samples, so nothing is decoded for it. Pure.</summary>
public static class SessionPlans
{
    /// <summary>Every recording is in exactly one plan. Sorted by start, then by key of the winner.</summary>
    /// <param name="replaced">See <see cref="SameSession.Choose"/>.</param>
    /// <param name="unreadable">Keys of recordings whose original cannot be read: they give nothing.</param>
    public static IReadOnlyList<SessionPlan> Of(
        IReadOnlyCollection<RecordingSummary> ofOnePerson,
        IReadOnlyDictionary<string, IReadOnlyList<string>> replaced,
        IReadOnlySet<string> unreadable)
    {
        var groups = SameSession.Choose(ofOnePerson, replaced);
        var claims = new SessionClaims(groups, (group, one) => !unreadable.Contains(one.Key) && !IsCorrected(group, one, replaced));
        return
        [
            .. groups
                .Select((group, at) => new SessionMerging(group, (one, channel) => claims.Of(at, one, channel), one => RoleOf(group, one)).Plan())
                .OrderBy(plan => plan.Frame.Start)
                .ThenBy(plan => plan.Winner.Key, StringComparer.Ordinal),
        ];

        ContributionRole RoleOf(SessionGroup group, RecordingSummary one) =>
            IsCorrected(group, one, replaced) ? ContributionRole.Replaced
            : unreadable.Contains(one.Key) ? ContributionRole.Unreadable
            : one == group.Winner ? ContributionRole.Wins
            : ContributionRole.Gives;
    }

    /// <summary>What took its names is in the activity: it may have taken a channel out on purpose. Anything else that took them is another session, and nothing speaks against what it holds.</summary>
    private static bool IsCorrected(SessionGroup group, RecordingSummary one, IReadOnlyDictionary<string, IReadOnlyList<string>> replaced) =>
        one != group.Winner && replaced.TryGetValue(one.Sha, out var by) && group.Recordings.Any(other => other.Sha != one.Sha && by.Contains(other.Sha));
}
