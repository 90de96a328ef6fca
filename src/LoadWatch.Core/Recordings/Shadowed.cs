namespace LoadWatch.Recordings;

/// <summary>
/// What an app on the device states of a session beside the device's own fields for the same: those count, this is shown. Null where nothing is stated twice.
/// </summary>
public sealed record Shadowed
{
    public static Shadowed None { get; } = new();

    public double? ElapsedSeconds { get; init; }

    public double? TimerSeconds { get; init; }

    public double? DistanceMetres { get; init; }

    /// <summary>Readings of the rows in which the device's own field holds one too.</summary>
    public IReadOnlyDictionary<Channel, ChannelStatistics> Channels { get; init; } = new Dictionary<Channel, ChannelStatistics>();
}
