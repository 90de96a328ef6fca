using LoadWatch.Activities;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Plans the activities of one person around changed recordings, within one state of the store.</summary>
/// <param name="starting">The person's recordings that start in a range.</param>
public sealed class SessionPlanning(StoreSession session, RecordingShelf shelf, Func<Instant, Instant, IEnumerable<RecordingSummary>> starting)
{
    /// <summary>Groups of recordings that can bear on each other, around each of those that changed; each group once.</summary>
    public IEnumerable<IReadOnlyList<RecordingSummary>> Around(IEnumerable<RecordingSummary> changed)
    {
        var reached = Instant.MinValue;
        foreach (var one in changed.OrderBy(one => one.Start))
        {
            // Up to there everything is in the group before, and touches nothing beyond it.
            if (one.Start > reached || one.End > reached)
            {
                var group = SessionNeighbours.Around(one.Start, one.End, starting);
                reached = group.Select(other => other.End).Append(one.End).Max();
                yield return group;
            }
        }
    }

    /// <summary>A recording whose original cannot be read gives nothing, and then others may give instead.</summary>
    /// <param name="isWanted">Whether the values of a plan are wanted: only then its recordings are read.</param>
    public IReadOnlyList<SessionPlan> Plan(IReadOnlyList<RecordingSummary> group, Func<SessionPlan, bool> isWanted)
    {
        var replaced = group.Count < 2 ? new Dictionary<string, IReadOnlyList<string>>(StringComparer.Ordinal) : Replaced(group);
        var unreadable = new HashSet<string>(StringComparer.Ordinal);
        while (true)
        {
            var plans = SessionPlans.Of(group, replaced, unreadable);
            var missing = plans.Where(isWanted).SelectMany(plan => plan.Givers).Where(key => !shelf.Has(key, ArrivalOf)).ToList();
            if (missing.Count == 0)
            {
                return plans;
            }

            unreadable.UnionWith(missing);
        }
    }

    /// <summary>How the activities of a group are stored now, by the key of the winner.</summary>
    public IReadOnlyDictionary<string, StoredMerge> Stored(IReadOnlyList<RecordingSummary> group)
    {
        var keys = group.Select(one => one.Key).ToHashSet(StringComparer.Ordinal);
        return session.Activities.Merges(group[0].Person, group.Min(one => one.Start), group.Max(one => one.Start))
            .Where(one => keys.Contains(one.Winner.Key))
            .ToDictionary(one => one.Winner.Key, StringComparer.Ordinal);
    }

    /// <summary>What a plan changes of what is stored. What gives and was just decoded is computed anew, as anything may have changed by which it is.</summary>
    public SessionChange ChangeOf(SessionPlan plan, IReadOnlyDictionary<string, StoredMerge> stored)
    {
        if (!stored.TryGetValue(plan.Winner.Key, out var before)
            || plan.Givers.Any(key => shelf.FreshOf(key) is not null)
            || !plan.GivesAs(before.Frame, before.Contributions))
        {
            return SessionChange.Values;
        }

        return plan.IsAs(before.Frame, before.Contributions) ? SessionChange.None : SessionChange.Recordings;
    }

    private Arrival? ArrivalOf(string sha) => session.Arrivals.Get(sha);

    private Dictionary<string, IReadOnlyList<string>> Replaced(IReadOnlyList<RecordingSummary> group) => group
        .Select(one => one.Sha)
        .Distinct(StringComparer.Ordinal)
        .Select(sha => (sha, By: session.Sightings.Replaced(sha)))
        .Where(one => one.By is not null)
        .ToDictionary(one => one.sha, one => one.By!, StringComparer.Ordinal);
}

/// <summary>What a plan changes of a stored activity.</summary>
public enum SessionChange
{
    None,

    /// <summary>Only what becomes of recordings that give nothing: a copy came or went.</summary>
    Recordings,

    /// <summary>What counts.</summary>
    Values,
}
