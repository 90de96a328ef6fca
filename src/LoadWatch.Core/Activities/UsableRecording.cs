using LoadWatch.Capacity;
using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>A recording after the quality cuts, with the histograms of what is usable.</summary>
public sealed class UsableRecording
{
    private static readonly Channel[] Counted = [Channel.HeartRate, Channel.Power, Channel.Speed];

    private readonly double shareWanted;
    private readonly JudgedRecording judged;
    private readonly Lazy<IReadOnlyDictionary<Channel, BestMeans>> bestMeans;

    /// <param name="limits">Null for the defaults.</param>
    public UsableRecording(Recording recording, double shareWanted, QualityLimits? limits = null)
        : this(recording, shareWanted, new JudgedRecording(recording, limits ?? new QualityLimits()), heartRate: null)
    {
    }

    private UsableRecording(Recording recording, double shareWanted, JudgedRecording judged, JudgedChannel? heartRate)
    {
        this.shareWanted = shareWanted;
        this.judged = judged;
        Recording = recording;
        Channels = UsableSamples.ChannelsOf(recording)
            .ToDictionary(channel => channel, channel => (channel == Channel.HeartRate ? heartRate ?? judged[channel] : judged[channel]).Usable);
        Histograms = Counted
            .Where(channel => this[channel] is not null)
            .ToDictionary(channel => channel, channel => ChannelHistogram.Of(Channels[channel]));
        bestMeans = new(() => Counted
            .Where(channel => this[channel] is not null)
            .Select(channel => (Channel: channel, Means: Capacity.BestMeans.Of(this[channel]!)))
            .Where(one => one.Means.Values.Count > 0)
            .ToDictionary(one => one.Channel, one => one.Means));
    }

    public Recording Recording { get; }

    /// <summary>Every channel that the recording holds, usable or not.</summary>
    public IReadOnlyDictionary<Channel, UsableChannel> Channels { get; }

    /// <summary>Of heart rate, power and speed, where usable.</summary>
    public IReadOnlyDictionary<Channel, Histogram> Histograms { get; }

    /// <summary>Of heart rate, power and speed, where usable. Found when asked for first.</summary>
    public IReadOnlyDictionary<Channel, BestMeans> BestMeans => bestMeans.Value;

    /// <summary>What of it does not count: whole rows and time without rows first, then by channel, reason and time.</summary>
    public IReadOnlyList<Cut> Cuts => [.. judged.RowCuts, .. Channels.OrderBy(one => one.Key).SelectMany(one => one.Value.Cuts)];

    /// <summary>Channels that were recorded, but of which too little is usable.</summary>
    public IEnumerable<UsableChannel> TooLittle => Channels.Values.Where(channel => this[channel.Channel] is null);

    /// <summary>The channel, or null where it was not recorded or too little of it is usable.</summary>
    public UsableChannel? this[Channel channel] =>
        Channels.TryGetValue(channel, out var found) && found.Count > 0 && found.Share >= shareWanted ? found : null;

    /// <summary>The same without heart rates above a limit, bpm; itself where there is none.</summary>
    public UsableRecording WithHeartRateUpTo(double bpm) =>
        Channels.TryGetValue(Channel.HeartRate, out var heartRate) && heartRate.Count > 0 && heartRate.Extremes().Largest > bpm
            ? new UsableRecording(Recording, shareWanted, judged, judged[Channel.HeartRate].UpTo(bpm))
            : this;
}
