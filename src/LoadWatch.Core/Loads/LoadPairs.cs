using NodaTime;

namespace LoadWatch.Loads;

/// <summary>The sessions of a person that have two quantities both, in an order of their own, so that theirs does not matter (I-5).</summary>
internal sealed class LoadPairs
{
    private readonly Pair[] pairs;

    /// <param name="wanted">Name of y.</param>
    /// <param name="from">Name of x.</param>
    public LoadPairs(IEnumerable<SessionLoads> sessions, string wanted, string from) => pairs =
    [
        .. sessions
            .Select(session => (session.Date, X: session[from], Y: session[wanted]))
            .Where(both => both.X is not null && both.Y is not null)
            .Select(both => new Pair(both.Date, both.X!.Value, both.Y!.Value))
            .OrderBy(pair => pair.Date).ThenBy(pair => pair.X).ThenBy(pair => pair.Y),
    ];

    /// <summary>Pairs dated from <paramref name="since"/> to the day before <paramref name="before"/>.</summary>
    public ReadOnlySpan<Pair> Between(LocalDate since, LocalDate before)
    {
        var (first, end) = (FirstFrom(since), FirstFrom(before));
        return pairs.AsSpan(first, end - first);
    }

    private int FirstFrom(LocalDate date) => Sorted.FirstFrom<Pair, LocalDate>(pairs, date, pair => pair.Date);

    public readonly record struct Pair(LocalDate Date, double X, double Y);
}
