using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Service.Demo;

/// <summary>The recording that a reader of the activity's file would get.</summary>
public static class DemoRecording
{
    public static Recording Of(FitActivity activity)
    {
        var samples = activity.Samples;
        return new Recording
        {
            Part = 1,
            Sport = activity.Sport,
            Start = activity.Start,
            LocalOffset = activity.LocalOffset,
            ElapsedSeconds = samples.Count > 0 ? (samples[^1].Time - activity.Start).TotalSeconds : null,
            Device = activity.Device,
            Sets = activity.Sets,
            Laps = 1,
            Samples = new SampleSeries([.. samples.Select(sample => sample.Time.ToUnixTimeMilliseconds())], Columns(samples)),
        };
    }

    private static Dictionary<Channel, double[]> Columns(IReadOnlyList<FitSample> samples) => new (Channel Channel, double[] Values)[]
    {
        (Channel.HeartRate, Column(samples, sample => sample.HeartRate)),
        (Channel.Power, Column(samples, sample => sample.Power)),
        (Channel.Speed, Column(samples, sample => sample.Speed)),
        (Channel.Cadence, Column(samples, sample => sample.Cadence)),
        (Channel.Distance, Column(samples, sample => sample.Distance)),
        (Channel.Altitude, Column(samples, sample => sample.Altitude)),
    }.Where(column => !Array.TrueForAll(column.Values, double.IsNaN)).ToDictionary(column => column.Channel, column => column.Values);

    private static double[] Column(IReadOnlyList<FitSample> samples, Func<FitSample, double?> read) =>
        [.. samples.Select(sample => read(sample) ?? double.NaN)];
}
