namespace LoadWatch.Delivery;

public enum ChannelResult
{
    /// <summary>The channel has it; it may be recorded as sent (I-7).</summary>
    Delivered,

    /// <summary>The outside stood in the way; the same again may succeed later.</summary>
    TryAgain,

    /// <summary>Refused as things stand, a login or a permission: tried again, but seldom.</summary>
    TryAgainSlowly,

    /// <summary>The same again would be refused for good.</summary>
    Failed,
}

/// <summary>What became of one attempt.</summary>
/// <param name="Reason">In plain words; empty when delivered.</param>
public sealed record ChannelOutcome(ChannelResult Result, string Reason)
{
    public static ChannelOutcome Delivered { get; } = new(ChannelResult.Delivered, "");

    public static ChannelOutcome TryAgain(string reason) => new(ChannelResult.TryAgain, reason);

    public static ChannelOutcome TryAgainSlowly(string reason) => new(ChannelResult.TryAgainSlowly, reason);

    public static ChannelOutcome Failed(string reason) => new(ChannelResult.Failed, reason);
}
