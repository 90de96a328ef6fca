using LoadWatch.Activities;
using LoadWatch.Recordings;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Pipeline;

/// <summary>The values of planned activities: of one recording alone as decoding computed them, of merged ones from all that give.</summary>
public sealed class SessionValues(ArrivalDecoder decoder, RecordingShelf shelf)
{
    private readonly Dictionary<string, (SessionPlan Plan, ActivityValues Values)> foreseen = new(StringComparer.Ordinal);

    /// <summary>The group behind may be decoded by other reference values while this one commits.</summary>
    private readonly TableBasis basis = decoder.Basis;

    /// <summary>Computed before the transaction that will ask for them; where it plans otherwise they are not used.</summary>
    public void Foresee(IEnumerable<(SessionPlan Plan, ActivityValues Values)> computed)
    {
        foreach (var one in computed)
        {
            foreseen[one.Plan.Winner.Key] = one;
        }
    }

    /// <summary>Whether the values are at hand, so that nothing needs to be decoded for them.</summary>
    public bool IsKnown(SessionPlan plan) => Known(plan) is not null;

    /// <param name="arrivalOf">Asked for the arrivals of recordings that are not at hand. All that give must be readable.</param>
    public ActivityValues Of(SessionPlan plan, Func<string, Arrival?> arrivalOf) => Known(plan) ?? Compute(plan, arrivalOf);

    private ActivityValues? Known(SessionPlan plan)
    {
        var winner = plan.Contributions[0];
        if (winner is { Gifts: null, Role: ContributionRole.Wins } && shelf.FreshOf(winner.Key) is { } alone)
        {
            return WithRemarks(plan, alone.Values);
        }

        return foreseen.TryGetValue(plan.Winner.Key, out var computed) && plan.IsAs(computed.Plan.Frame, computed.Plan.Contributions) ? computed.Values : null;
    }

    private ActivityValues Compute(SessionPlan plan, Func<string, Arrival?> arrivalOf)
    {
        try
        {
            var recordings = plan.Givers.ToDictionary(key => key, key => shelf.Find(key, arrivalOf)!, StringComparer.Ordinal);
            var values = decoder.Merged(plan, recordings) is { } merged ? decoder.Values(merged, plan.Winner.Person, basis) : new ActivityValues();
            return WithRemarks(plan, values with { Remarks = [.. MergedSession.Partial(plan, values), .. values.Remarks] });
        }
        catch (Exception e) when (ArrivalDecoder.IsDefect(e))
        {
            return WithRemarks(plan, new ActivityValues { Remarks = [$"nothing is computed, by a defect of LoadWatch, please report it: {e.GetType().Name} while recordings were merged"] });
        }
    }

    private static ActivityValues WithRemarks(SessionPlan plan, ActivityValues values)
    {
        var unreadable = plan.Contributions.Where(one => one.Role == ContributionRole.Unreadable).Select(one => RecordingKey.Parse(one.Key)).ToList();
        return unreadable.Count == 0 ? values : values with
        {
            Remarks = [.. unreadable.Select(one => $"computed without session {one.Part} of {one.Sha[..12]}: its original in the archive is missing or damaged"), .. values.Remarks],
        };
    }
}
