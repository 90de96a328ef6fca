using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>What the cuts make of recordings, times in seconds from <see cref="Given.Start"/>.</summary>
internal static class Judging
{
    public static IReadOnlyList<Cut> Cuts(Recording recording, QualityLimits? limits = null) => new UsableRecording(recording, 0.5, limits).Cuts;

    public static IReadOnlyList<Cut> Cuts(string sport, params (Channel, double[])[] columns) => Cuts(Given.Recording(sport, Given.EverySecond(columns)));

    public static double? From(this Cut cut) => (cut.Stretch.From - Given.StartMilliseconds) / 1000.0;

    public static double? To(this Cut cut) => (cut.Stretch.To - Given.StartMilliseconds) / 1000.0;

    public static Pause Pause(double from, double? to) =>
        new(Given.Start + NodaTime.Duration.FromSeconds(from), to is { } end ? Given.Start + NodaTime.Duration.FromSeconds(end) : null);

    /// <summary>Seconds that each usable reading stands for.</summary>
    public static double Seconds(this UsableChannel channel) => channel.Samples.Sum(sample => sample.Milliseconds) / 1000.0;
}
