using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>How remarks call a channel.</summary>
public static class ChannelWords
{
    public static string Of(Channel channel) => channel switch
    {
        Channel.HeartRate => "heart rate",
        Channel.Power => "power",
        Channel.Speed => "speed",
        Channel.Cadence => "cadence",
        Channel.Distance => "distance",
        Channel.Altitude => "altitude",
        _ => throw new ArgumentOutOfRangeException(nameof(channel)),
    };
}
