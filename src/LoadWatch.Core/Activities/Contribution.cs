using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>What becomes of a recording in its activity.</summary>
public enum ContributionRole
{
    /// <summary>The activity is named by it.</summary>
    Wins,

    /// <summary>It gives what richer ones have not.</summary>
    Gives,

    /// <summary>Richer ones hold all that it could give.</summary>
    Superseded,

    /// <summary>Its names hold a corrected content now, which is in the activity too: it gives nothing.</summary>
    Replaced,

    /// <summary>Its original in the archive is missing or damaged: the activity is computed without it.</summary>
    Unreadable,
}

/// <summary>What one recording gives to its activity.</summary>
/// <param name="Key">Of the recording.</param>
/// <param name="Gifts">Null: all that it holds, as it is.</param>
public sealed record Contribution(string Key, ContributionRole Role, IReadOnlyList<Gift>? Gifts)
{
    /// <summary>The device or layout that wrote it (I-6): a source has recorded, also where another one counts.</summary>
    public string Source { get; init; } = "";

    public bool IsAs(Contribution other) =>
        Key == other.Key
        && Role == other.Role
        && Gifts is null == other.Gifts is null
        && (Gifts is null || (Gifts.Count == other.Gifts!.Count && Gifts.Zip(other.Gifts).All(pair => pair.First.IsAs(pair.Second))));
}

/// <summary>A thing that a recording gives.</summary>
/// <param name="Channel">Null for what has no readings.</param>
/// <param name="Whole">What it is where it has no readings; null for a channel.</param>
/// <param name="Stretches">Of a channel: when its readings count, in time order.</param>
public sealed record Gift(Channel? Channel, WholeGift? Whole, IReadOnlyList<Stretch> Stretches)
{
    public static Gift Of(WholeGift whole) => new(null, whole, []);

    public bool IsAs(Gift other) => Channel == other.Channel && Whole == other.Whole && Stretches.SequenceEqual(other.Stretches);
}

/// <summary>What a recording gives that has no readings.</summary>
public enum WholeGift
{
    /// <summary>Its strength sets.</summary>
    Sets,

    /// <summary>The distance that its session states.</summary>
    StatedDistance,

    /// <summary>Its sport.</summary>
    Sport,
}
