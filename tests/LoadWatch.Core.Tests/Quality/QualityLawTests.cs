using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

public class QualityLawTests
{
    private static readonly double[] Odd = [double.NaN, CutMark.Of(CutReason.MarkedBad), 0, 254, -1, double.PositiveInfinity, 1e300];

    private static readonly Gen<double> Reading = Gen.Frequency((6, Gen.Double[20, 300]), (2, Gen.Int[0, 6].Select(one => Odd[one])), (2, Gen.Const(150.0)));

    private static readonly Gen<Recording> Recordings = Gen.Select(
        Gen.Select(Gen.Int[0, 15_000], Reading, Reading, Reading).Array[2, 120],
        Gen.Select(Gen.Int[0, 600], Gen.Int[1, 200]).Array[0, 3],
        Gen.Bool,
        (rows, pauses, onFoot) => Of(rows, pauses, onFoot));

    /// <summary>Heart rate at most 1 bpm a second, no speed that a body cannot reach: whatever the walk, nothing is wrong with it.</summary>
    [Fact]
    public void OfACleanRecordingNothingIsCut() =>
        Gen.Select(Gen.Int[-1, 1].Array[600], Gen.Int[0, 900].Array[601], Gen.Double[-1, 1].Array[600], Gen.Bool).Sample((beats, watts, changes, onFoot) =>
            Judging.Cuts(
                onFoot ? "running" : "cycling",
                (Channel.HeartRate, Walk(130, 60, 190, [.. beats.Select(beat => (double)beat)])),
                (Channel.Power, [.. watts.Select(value => (double)value)]),
                (Channel.Speed, Walk(3, 0, 8, changes)),
                (Channel.Cadence, Walk(84, 70, 95, changes))).Count == 0);

    [Fact]
    public void TheSharesOfAChannelAddUpToOne() => Recordings.Sample(recording =>
    {
        var usable = new UsableRecording(recording, 0.5);
        return usable.Channels.Values.All(channel =>
            channel.Cuts.Sum(cut => cut.Milliseconds) == 0 && channel.Seconds() == 0
            || Math.Abs(channel.Share + channel.Cuts.Sum(cut => cut.Share) - 1) < 1e-6);
    });

    /// <summary>Sampled time, gaps and a stopped timer are the time from the first row to the last.</summary>
    [Fact]
    public void NoTimeIsLost() => Recordings.Sample(recording =>
    {
        var usable = new UsableRecording(recording, 0.5);
        var channel = usable.Channels.Values.FirstOrDefault();
        var sampled = channel is null ? 0 : (long)Math.Round(channel.Seconds() * 1000) + channel.Cuts.Sum(cut => cut.Milliseconds);
        var without = usable.Cuts.Where(cut => cut.Channel is null).Sum(cut => cut.Milliseconds);
        return channel is null || sampled + without == (recording.Last!.Value - recording.First!.Value).TotalMilliseconds;
    });

    [Fact]
    public void EveryCutLiesWithinTheRecordingAndSharesWithinOne() => Recordings.Sample(recording => Judging.Cuts(recording).All(cut =>
        cut is { Share: >= 0 and <= 1, Readings: >= 0, Milliseconds: >= 0 }
        && cut.Stretch.From >= recording.First!.Value.ToUnixTimeMilliseconds()
        && cut.Stretch.From < cut.Stretch.To
        && cut.Milliseconds <= cut.Stretch.To - cut.Stretch.From
        && cut.Stretch.To <= recording.Last!.Value.ToUnixTimeMilliseconds() + 1));

    [Fact]
    public void TheOrderOfRowsOfDifferentTimesOnlyTellsThatTheyWereOutOfOrder() => Gen.Select(Recordings, Gen.Int[0, 1000]).Sample((recording, seed) =>
    {
        var distinct = Enumerable.Range(0, recording.Samples.Count).DistinctBy(row => recording.Samples.UnixMilliseconds[row]).ToList();
        var turned = distinct.OrderBy(row => ((row * 7919L) + seed) % 101).ToList();
        var (one, other) = (Judging.Cuts(Rows(recording, distinct)), Judging.Cuts(Rows(recording, turned)));
        return one.SequenceEqual(other.Where(cut => cut.Reason != CutReason.OutOfOrder));
    });

    [Fact]
    public void CuttingWhatWasCutCutsNothingMore() => Recordings.Sample(recording =>
    {
        var first = new UsableRecording(recording, 0.5);
        return first.Channels.Values.All(channel => channel.Values.ToArray().All(value => ChannelLimits.Usable(channel.Channel, value, recording.Sport)))
            && first.Cuts.SequenceEqual(new UsableRecording(recording, 0.5).Cuts);
    });

    private static Recording Rows(Recording recording, IReadOnlyList<int> rows) => recording with { Samples = recording.Samples.Take(rows) };

    private static Recording Of((int Apart, double HeartRate, double Power, double Speed)[] rows, (int From, int Seconds)[] pauses, bool onFoot)
    {
        var time = Given.StartMilliseconds;
        long[] times = [.. rows.Select(row => time += row.Apart / 1000 * 1000)];
        var samples = new SampleSeries(times, new Dictionary<Channel, double[]>
        {
            [Channel.HeartRate] = [.. rows.Select(row => row.HeartRate)],
            [Channel.Power] = [.. rows.Select(row => row.Power)],
            [Channel.Speed] = [.. rows.Select(row => row.Speed / 20)],
        });
        return Given.Recording(onFoot ? "running" : "cycling", samples) with
        {
            Pauses = [.. pauses.Select(pause => Judging.Pause(pause.From, pause.From + pause.Seconds))],
        };
    }

    private static double[] Walk(double start, double least, double most, double[] changes)
    {
        var value = start;
        return [start, .. changes.Select(change => value = Math.Clamp(value + change, least, most))];
    }
}
