namespace LoadWatch.Activities;

/// <summary>A stretch of time in milliseconds since 1970-01-01T00:00:00Z; null is open on that side.</summary>
/// <param name="From">Belongs to it.</param>
/// <param name="To">Does not belong to it any more.</param>
public sealed record Stretch(long? From, long? To)
{
    public static Stretch Always { get; } = new(null, null);

    public bool Holds(long time) => !(time < From) && !(time >= To);
}

/// <summary>Lists of stretches.</summary>
internal static class Stretches
{
    /// <summary>What is left of one without others, in time order.</summary>
    public static IReadOnlyList<Stretch> Without(this Stretch whole, IEnumerable<Stretch> others)
    {
        List<Stretch> left = [whole];
        foreach (var other in others)
        {
            left = left.ConvertAll(one => Without(one, other)).SelectMany(pieces => pieces).ToList();
        }

        return left;
    }

    /// <summary>Sorted, and those that meet or overlap made one; a millisecond is no gap. All must have both ends.</summary>
    public static IReadOnlyList<Stretch> Joined(this IEnumerable<Stretch> stretches)
    {
        var joined = new List<Stretch>();
        foreach (var one in stretches.OrderBy(one => one.From).ThenBy(one => one.To))
        {
            if (joined.Count > 0 && one.From <= joined[^1].To + 1)
            {
                joined[^1] = joined[^1] with { To = Math.Max(joined[^1].To!.Value, one.To!.Value) };
            }
            else
            {
                joined.Add(one);
            }
        }

        return joined;
    }

    /// <summary>Length of stretches that do not overlap and have both ends, milliseconds.</summary>
    public static long Length(this IEnumerable<Stretch> stretches) => stretches.Sum(one => one.To!.Value - one.From!.Value);

    /// <summary>The part of one that lies within another, or null.</summary>
    public static Stretch? Within(this Stretch one, Stretch other)
    {
        var from = Later(one.From, other.From);
        var to = Earlier(one.To, other.To);
        return from >= to ? null : new Stretch(from, to);
    }

    private static IEnumerable<Stretch> Without(Stretch one, Stretch other)
    {
        if (one.Within(other) is null)
        {
            return [one];
        }

        var before = other.From is null ? null : one.Within(new Stretch(null, other.From));
        var after = other.To is null ? null : one.Within(new Stretch(other.To, null));
        return new[] { before, after }.OfType<Stretch>();
    }

    private static long? Later(long? a, long? b) => a is null || b > a ? b ?? a : a;

    private static long? Earlier(long? a, long? b) => a is null || b < a ? b ?? a : a;
}
