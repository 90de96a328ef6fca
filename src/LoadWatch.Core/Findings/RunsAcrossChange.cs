using System.Text.Json;
using LoadWatch.Loads;
using LoadWatch.Days;

namespace LoadWatch.Findings;

/// <summary>With what rules of load begin a date while, or after, a changed reference value lies in the window (I-15).</summary>
/// <param name="Now">Runs by the values of the date.</param>
/// <param name="Former">Runs by those before the change; null where no change lies in the window.</param>
public sealed record RunsAcrossChange(IReadOnlyDictionary<string, object> Now, IReadOnlyDictionary<string, object>? Former)
{
    private static readonly HashSet<string> Rules = [.. RuleBook.OfLoad.Select(rule => rule.Name)];

    /// <param name="carried">Of the day before.</param>
    /// <param name="period">Of the date.</param>
    /// <param name="former">At the beginning of the window that ends with the date.</param>
    /// <param name="formerYesterday">At the beginning of the window of the day before.</param>
    /// <param name="isNew">Whether the period begins with the date: a comparison begins with a change, and not again when one that was taken back leaves the window.</param>
    public static RunsAcrossChange At(Carried carried, ReferencePeriod period, ReferencePeriod former, ReferencePeriod formerYesterday, bool isNew)
    {
        var lies = former.Basis != period.Basis;
        return carried.FormerRuns is not { } runs ? new(carried.Runs, lies && isNew ? carried.Runs : null)
            : (lies, former.Basis == formerYesterday.Basis) switch
            {
                (true, true) => new(carried.Runs, runs),
                (true, false) => new(carried.Runs, Settled(carried.Runs, runs, period, formerYesterday)),
                (false, true) => new(WithOthers(runs, carried.Runs), null), // Back to the values before the change.
                (false, false) => new(Settled(carried.Runs, runs, period, formerYesterday), null),
            };
    }

    /// <summary>
    /// A run that stood by the new values alone does not come to stand because the change has left the window: it is raised like any other. Where there was no value
    /// before, the new ones spoke alone, and what stands is an alert.
    /// </summary>
    private static IReadOnlyDictionary<string, object> Settled(
        IReadOnlyDictionary<string, object> now, IReadOnlyDictionary<string, object> former, ReferencePeriod period, ReferencePeriod before)
    {
        if (period.ChangesSince(before).Any(change => change is { Before: null, Now: not null }))
        {
            return now;
        }

        var settled = now.Where(run => !IsOfLoad(run.Key) || !Stands(run.Value) || Stands(former.GetValueOrDefault(run.Key))).ToDictionary(StringComparer.Ordinal);
        foreach (var (key, run) in former.Where(run => now.ContainsKey(run.Key)))
        {
            settled.TryAdd(key, run);
        }

        return settled;
    }

    private static Dictionary<string, object> WithOthers(IReadOnlyDictionary<string, object> ofLoad, IReadOnlyDictionary<string, object> all) =>
        ofLoad.Where(run => IsOfLoad(run.Key)).Concat(all.Where(run => !IsOfLoad(run.Key))).ToDictionary(StringComparer.Ordinal);

    private static bool IsOfLoad(string key) => Rules.Contains(key.Split('/')[0]);

    private static bool Stands(object? run) => run switch
    {
        IStanding standing => standing.Since is not null,
        JsonElement text => text.TryGetProperty("since", out var since) && since.ValueKind != JsonValueKind.Null,
        _ => false,
    };
}
