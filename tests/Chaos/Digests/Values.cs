using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Digests;

/// <summary>What was computed, without what was told and when: for nights whose files came at other times than those they are compared with.</summary>
public static class Values
{
    private static readonly string[] Tables = ["recording|", "activity|", "day|", "table_row|"];

    public static IReadOnlyList<string> Of(Place place)
    {
        ArgumentNullException.ThrowIfNull(place);
        return [.. StoreDump.Lines(place.DatabasePath).Where(line => Tables.Any(table => line.StartsWith(table, StringComparison.Ordinal)))];
    }

    /// <exception cref="ChaosFailureException">They differ.</exception>
    public static void MustEqual(IReadOnlyList<string> seen, IReadOnlyList<string> wanted)
    {
        if (!seen.SequenceEqual(wanted, StringComparer.Ordinal))
        {
            var (less, more) = (wanted.Except(seen, StringComparer.Ordinal).ToList(), seen.Except(wanted, StringComparer.Ordinal).ToList());
            throw new ChaosFailureException($"other values: lacks {less.Count} rows, has {more.Count} besides: {string.Join("; ", less.Take(2).Concat(more.Take(2)))}");
        }
    }
}
