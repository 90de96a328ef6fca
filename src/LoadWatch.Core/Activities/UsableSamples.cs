using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// Cuts a channel down to what can be used. Rows are sorted by time, rows of one time keep the order of the file, undated rows are left
/// out.
/// A reading stands for the time to the next one of its channel, at most 10 s and never for one that was cut or for a stopped timer; the last stands as long as its row.
/// </summary>
public static class UsableSamples
{
    /// <summary>The longest time that one reading may stand for, milliseconds. A choice: it bridges sparse recording, not a stop.</summary>
    public const int LongestMilliseconds = 10_000;

    /// <summary>Milliseconds in seconds; mostly it is one.</summary>
    internal static double Seconds(int milliseconds) => milliseconds == 1000 ? 1 : milliseconds / 1000.0;

    /// <summary>The channels with a reading, cut or not, heart rate also where beats came only in messages of their own.</summary>
    public static IEnumerable<Channel> ChannelsOf(Recording recording) =>
        SampleSeries.EveryChannel.Where(channel =>
            recording.SeriesOf(channel).Has(channel) || (channel == Channel.HeartRate && recording.LateHeartRates.Count > 0));

    /// <summary>One channel by the limits at their defaults.</summary>
    public static UsableChannel Of(Recording recording, Channel channel) => new JudgedRecording(recording, new QualityLimits())[channel].Usable;
}
