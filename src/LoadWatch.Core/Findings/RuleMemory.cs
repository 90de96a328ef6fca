using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>What rules keep from one date to the next, so that they can be taken up behind any date. Complete once their findings are read to the end.</summary>
/// <param name="before">What was carried of the day before the first date judged.</param>
public sealed class RuleMemory(Carried before)
{
    private static readonly IReadOnlyDictionary<string, object> Nothing = new Dictionary<string, object>();

    private readonly Dictionary<LocalDate, SortedDictionary<string, object>> kept = [];

    /// <summary>What is to be carried of a date.</summary>
    public IReadOnlyDictionary<string, object> On(LocalDate date) => kept.GetValueOrDefault(date) ?? Nothing;

    /// <summary>What a rule kept on the day before the first date judged, or null.</summary>
    internal T? Before<T>(string key)
        where T : class =>
        before.Run<T>(key);

    /// <summary>Keys on the day before the first date judged, in ordinal order.</summary>
    internal IEnumerable<string> KeysBefore => before.Runs.Keys.Order(StringComparer.Ordinal);

    /// <param name="state">Null: nothing to keep.</param>
    internal void Keep(LocalDate date, string key, object? state)
    {
        if (state is null)
        {
            kept.GetValueOrDefault(date)?.Remove(key);
            return;
        }

        if (!kept.TryGetValue(date, out var ofDate))
        {
            kept[date] = ofDate = new SortedDictionary<string, object>(StringComparer.Ordinal);
        }

        ofDate[key] = state;
    }
}
