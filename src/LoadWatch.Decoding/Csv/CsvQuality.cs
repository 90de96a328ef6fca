using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// The column that says how well a position was received: satellites in sight, an error in metres, a share. Where it lies outside the
/// limits, or is empty, the row has no reading of <see cref="Channels"/>; the row itself stays, so that the usable share tells.
/// </summary>
public sealed record CsvQuality
{
    /// <summary>The column's name. No default.</summary>
    public string Column { get; init; } = "";

    /// <summary>The lowest value that is good enough, in the unit of the file. Default null: no lower limit.</summary>
    public double? AtLeast { get; init; }

    /// <summary>The highest value that is good enough, in the unit of the file. Default null: no upper limit.</summary>
    public double? AtMost { get; init; }

    /// <summary>The channels that depend on it. Default <c>speed</c>, <c>distance</c> and <c>altitude</c>.</summary>
    public IReadOnlyList<Channel> Channels { get; init; } = [Channel.Speed, Channel.Distance, Channel.Altitude];
}
