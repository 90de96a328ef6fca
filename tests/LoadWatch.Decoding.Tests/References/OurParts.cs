using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.References;

/// <summary>What LoadWatch gives of a part, in the form of the references.</summary>
internal static class OurParts
{
    public static ReferencePart Read(byte[] part)
    {
        var decoded = FitDecoder.Decode(part);
        return decoded.Problems.Any(problem => problem.Severity == ProblemSeverity.Error) ? new ReferencePart { Error = decoded.Problems[0].ToString() } : Of(decoded);
    }

    public static IReadOnlyList<Channel> Channels { get; } =
        [Channel.HeartRate, Channel.Power, Channel.Speed, Channel.Cadence, Channel.Distance, Channel.Altitude];

    private static ReferencePart Of(DecodedFile file) => new()
    {
        FileType = file.FileType,
        Serial = file.Recordings.Select(recording => recording.Device.Serial).FirstOrDefault(),
        Records = [.. file.Recordings.SelectMany(recording => Rows(recording.Samples))],
        Sessions = [.. file.Recordings.Select(recording => new ReferenceSession(
            recording.Start?.ToUnixTimeMilliseconds(), recording.Sport.Name, recording.Sport.Detail, recording.ElapsedSeconds, recording.TimerSeconds, recording.DistanceMetres))],
        Sets = [.. file.Recordings.SelectMany(recording => recording.Sets).Select(set => new ReferenceSet(
            set.Start?.ToUnixTimeMilliseconds(), set.DurationSeconds, set.Active, set.Exercise, set.Repetitions, set.Kilograms))],
        Beats = [.. file.Recordings.SelectMany(recording => recording.LateHeartRates).Select(beat => (double?)beat.BeatsPerMinute)],
        Intervals = [.. file.Recordings.SelectMany(recording => recording.BeatIntervals).Select(milliseconds => milliseconds / 1000.0)],
        LapsBySession = [.. file.Recordings.Select(recording => recording.Laps)],
        LengthsBySession = [.. file.Recordings.Select(recording => recording.Lengths)],
        PausesBySession = [.. file.Recordings.Select(recording => (IReadOnlyList<double?[]>)[.. recording.Pauses.Select(pause => (double?[])
            [pause.Start.ToUnixTimeMilliseconds(), pause.End?.ToUnixTimeMilliseconds()])])],
        Activity = file.Recordings.Select(recording => recording.LocalOffset).FirstOrDefault() is { } offset ? [0, offset.Seconds * 1000.0] : null,
    };

    private static IEnumerable<double?[]> Rows(SampleSeries samples)
    {
        var times = samples.UnixMilliseconds.ToArray();
        var columns = Channels.Select(channel => samples[channel].ToArray()).ToArray();
        return times.Select((time, row) => (double?[])
            [time == SampleSeries.Undated ? null : time, .. columns.Select(column => column.Length == 0 || double.IsNaN(column[row]) ? null : (double?)column[row])]);
    }
}
