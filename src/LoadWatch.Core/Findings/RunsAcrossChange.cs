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
    public static RunsAcrossChange At(Carried carried, ReferencePeriod period, ReferencePeriod former, ReferencePeriod formerYesterday)
    {
        var lies = former.Basis != period.Basis;
        return carried.FormerRuns is not { } runs ? new(carried.Runs, lies ? carried.Runs : null)
            : (lies, former.Basis == formerYesterday.Basis) switch
            {
                (true, true) => new(carried.Runs, runs),
                (true, false) => new(carried.Runs, Settled(carried.Runs, runs)),
                (false, true) => new(WithOthers(runs, carried.Runs), null), // Back to the values before the change.
                (false, false) => new(Settled(carried.Runs, runs), null),
            };
    }

    /// <summary>A run that stood by the new values alone does not come to stand because the change has left the window: it is raised like any other.</summary>
    private static Dictionary<string, object> Settled(IReadOnlyDictionary<string, object> now, IReadOnlyDictionary<string, object> former)
    {
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
