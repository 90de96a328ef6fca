using System.Globalization;
using CsCheck;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Whatever a file holds, the answer is a value (I-10), memory stays within bounds (I-11), and a damaged part gives nothing. LOADWATCH_FUZZ sets how many
/// files of each kind are tried; tests/fuzz.sh tries many.
/// </summary>
public class FitFuzzTests
{
    private const long MostBytes = 64 << 20;
    private static readonly int Tries = int.Parse(Environment.GetEnvironmentVariable("LOADWATCH_FUZZ") ?? "100000", CultureInfo.InvariantCulture);

    [Fact]
    public void ChangedFilesAreSurvived() => Gen.UInt.Sample(number => Survives(HostileParts.Mutated(number)), iter: Tries);

    [Fact]
    public void FilesOfAnyContentAreSurvived() => Gen.UInt.Sample(number => Survives(HostileParts.Grammatical(number)), iter: Tries);

    [Fact]
    public void TheSeedsReachWhatTheyAreFor()
    {
        var seeds = HostileParts.AllSeeds.Select(seed => FitDecoder.Decode(seed)).ToList();
        Assert.Contains(seeds, seed => seed.Recordings.Any(recording => recording.LateHeartRates.Count > 8));
        Assert.Contains(seeds, seed => seed.Recordings.Any(recording => recording.Sport.Name == "walking" && recording.Samples.Count > 60));
        Assert.Contains(seeds, seed => seed is { Table: not null, Recordings.Count: 0 });
        Assert.Contains(seeds, seed => seed.Recordings.Any(recording => recording.Shadowed.Channels.Count > 0));
        var grammatical = Enumerable.Range(0, 20_000).Select(number => FitDecoder.Decode(HostileParts.Grammatical((uint)number))).ToList();
        Assert.Contains(grammatical, file => file.Recordings.Any(recording => recording.LateHeartRates.Count > 0));
        Assert.Contains(grammatical, file => file.Recordings.Any(recording => recording.Samples.Channels.Contains(Channel.Speed)));
        Assert.Contains(grammatical, file => file.Recordings.Any(recording => recording.Sets.Any(set => set.Kilograms > 0)));
        var cut = Enumerable.Range(0, 20_000).Select(number => FitDecoder.Decode(HostileParts.Mutated((uint)number), salvages: true)).ToList();
        Assert.Contains(cut, file => file.Recordings.Any(recording => recording.CutOff is not null));
    }

    /// <summary>As a file is decoded where cut ones are refused, and where they are salvaged.</summary>
    private static void Survives(byte[] file)
    {
        var decoded = Measured(file, salvages: false);
        Assert.Equal(
            FitDecoder.CheckCompleteness(file) == FitCompleteness.Suspect || decoded.Problems.Any(problem => problem.Severity == ProblemSeverity.Error),
            decoded.Problems.Any(problem => problem.Reason.Length > 0 && !IsAboutBeats(problem)));
        var salvaged = Measured(file, salvages: true);
        Assert.True(decoded.Recordings.All(recording => recording.CutOff is null));
        Assert.InRange(salvaged.Recordings.Count(recording => recording.CutOff is null), decoded.Recordings.Count, decoded.Recordings.Count);
        Assert.Equal(salvaged.Recordings.Any(recording => recording.CutOff is not null), salvaged.Problems.Any(IsAboutSalvage));
    }

    private static bool IsAboutSalvage(Problem problem) => problem.Severity == ProblemSeverity.Warning && problem.Reason.EndsWith("what lies before is used", StringComparison.Ordinal);

    private static DecodedFile Measured(byte[] file, bool salvages)
    {
        var before = GC.GetAllocatedBytesForCurrentThread();
        var decoded = FitDecoder.Decode(file, salvages);
        Assert.True(GC.GetAllocatedBytesForCurrentThread() - before <= MostBytes + (4L * file.Length), "too much memory");
        Assert.InRange(decoded.Problems.Count, 0, 18);
        Assert.All(decoded.Problems, problem => Assert.InRange(problem.ByteOffset!.Value, 0, file.Length));
        foreach (var recording in decoded.Recordings)
            IsSound(recording);

        return decoded;
    }

    private static bool IsAboutBeats(Problem problem) => problem.Reason.StartsWith("heart beats", StringComparison.Ordinal);

    private static void IsSound(Recording recording)
    {
        Assert.True(recording.LateHeartRates.All(beat => beat.BeatsPerMinute is > 0 and < 255));
        Assert.True(recording.BeatIntervals.All(interval => interval is > 0 and < 65535));
        Assert.True(recording.Pauses.All(pause => pause.End is null || pause.End > pause.Start));
        Assert.All(new[] { recording.TimerSeconds, recording.DistanceMetres }, total => Assert.True(total is null || double.IsFinite(total.Value)));
        Assert.All(recording.Shadowed.Channels.Values, numbers => Assert.True(numbers.Count > 0 && double.IsFinite(numbers.Mean!.Value)));
        foreach (var channel in recording.Samples.Channels)
        {
            foreach (var value in recording.Samples[channel])
                Assert.True(double.IsNaN(value) || Math.Abs(value) < 1e20, $"{channel} {value}");
        }
    }
}
