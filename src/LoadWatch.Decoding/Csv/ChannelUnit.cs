using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// How a unit of a layout becomes the unit of the channel: the value times <paramref name="Times"/>, over <paramref name="Over"/>.
/// </summary>
internal readonly record struct ChannelUnit(double Times, double Over)
{
    private static readonly ChannelUnit Same = new(1, 1);

    /// <summary>Null for a unit that the channel does not have.</summary>
    public static ChannelUnit? Find(Channel channel, string unit) => (channel, unit) switch
    {
        (Channel.HeartRate, "bpm") => Same,
        (Channel.Power, "W") => Same,
        (Channel.Speed, "m/s") => Same,
        (Channel.Speed, "km/h") => new(1, 3.6),
        (Channel.Cadence, "rpm") => Same,
        (Channel.Distance, "m") => Same,
        (Channel.Distance, "km") => new(1000, 1),
        (Channel.Altitude, "m") => Same,
        _ => null,
    };

    public double Convert(double value) => value * Times / Over;
}
