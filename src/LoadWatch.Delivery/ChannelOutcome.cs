namespace LoadWatch.Delivery;

public enum ChannelResult
{
    /// <summary>The channel has it; it may be recorded as sent (I-7).</summary>
    Delivered,

    /// <summary>The outside stood in the way; the same again may succeed later.</summary>
    TryAgain,

    /// <summary>Somebody has to change something first.</summary>
    Failed,
}

/// <summary>What became of one attempt.</summary>
/// <param name="Reason">In plain words; empty when delivered.</param>
public sealed record ChannelOutcome(ChannelResult Result, string Reason)
{
    public static ChannelOutcome Delivered { get; } = new(ChannelResult.Delivered, "");

    public static ChannelOutcome TryAgain(string reason) => new(ChannelResult.TryAgain, reason);

    public static ChannelOutcome Failed(string reason) => new(ChannelResult.Failed, reason);
}
