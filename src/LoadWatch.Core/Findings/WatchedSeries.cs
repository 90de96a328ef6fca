using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.People;

namespace LoadWatch.Findings;

/// <summary>One person's days by what a rule of load looks at.</summary>
/// <param name="Quantity">Null for the group's load.</param>
/// <param name="Unit">Of the loads of its days.</param>
internal sealed record WatchedSeries(Person Person, string? Quantity, string Unit, IReadOnlyList<Day> Days)
{
    /// <summary>At the beginning of a sentence.</summary>
    public string Heading => Wording.Capital(Quantity is null ? "load" : QuantityWords.Of(Quantity));

    /// <summary>Under which a rule keeps its run over the series.</summary>
    public string KeyOf(IRule rule) => Quantity is null ? rule.Name : $"{rule.Name}/{Quantity}";

    /// <summary>The group's load first, then the quantities by name; one that is the group's load, or that nobody computed, is left out.</summary>
    public static IEnumerable<WatchedSeries> Of(RuleSubject subject, IReadOnlyList<string> quantities)
    {
        yield return new WatchedSeries(subject.Person, Quantity: null, subject.LoadUnit, subject.Days);
        foreach (var name in quantities.Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal))
        {
            if (name != subject.LoadQuantity && subject.Series.TryGetValue(name, out var series))
            {
                yield return new WatchedSeries(subject.Person, name, series.Unit, WithPlan(series.Days, subject.Days));
            }
        }
    }

    private static List<Day> WithPlan(IReadOnlyList<Day> days, IReadOnlyList<Day> planned)
    {
        if (days.Count != planned.Count)
        {
            throw new ArgumentException($"a series has {days.Count} days where the group's load has {planned.Count}", nameof(days));
        }

        return days.Select((day, index) => day with { Plan = planned[index].Plan }).ToList();
    }
}
