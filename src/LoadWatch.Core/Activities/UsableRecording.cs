using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>A recording after the quality cuts, with the histograms of what is usable.</summary>
public sealed class UsableRecording
{
    private static readonly Channel[] Counted = [Channel.HeartRate, Channel.Power, Channel.Speed];

    private readonly double shareWanted;

    public UsableRecording(Recording recording, double shareWanted)
    {
        this.shareWanted = shareWanted;
        Recording = recording;
        var timeline = SampleTimeline.Of(recording.Samples.Times);
        Channels = UsableSamples.ChannelsOf(recording).ToDictionary(channel => channel, channel => UsableSamples.Of(recording, channel, timeline));
        Histograms = Counted
            .Where(channel => this[channel] is not null)
            .ToDictionary(channel => channel, channel => ChannelHistogram.Of(Channels[channel]));
    }

    public Recording Recording { get; }

    /// <summary>Every channel that the recording holds, usable or not.</summary>
    public IReadOnlyDictionary<Channel, UsableChannel> Channels { get; }

    /// <summary>Of heart rate, power and speed, where usable.</summary>
    public IReadOnlyDictionary<Channel, Histogram> Histograms { get; }

    /// <summary>The channel, or null where it was not recorded or too little of it is usable.</summary>
    public UsableChannel? this[Channel channel] =>
        Channels.TryGetValue(channel, out var found) && found.Count > 0 && found.Share >= shareWanted ? found : null;

    /// <summary>Channels that were recorded, but of which too little is usable.</summary>
    public IEnumerable<UsableChannel> TooLittle => Channels.Values.Where(channel => this[channel.Channel] is null);
}
