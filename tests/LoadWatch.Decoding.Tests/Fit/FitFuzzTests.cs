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

    private static void Survives(byte[] file)
    {
        var before = GC.GetAllocatedBytesForCurrentThread();
        var decoded = FitDecoder.Decode(file);
        Assert.True(GC.GetAllocatedBytesForCurrentThread() - before <= MostBytes + (4L * file.Length), "too much memory");
        Assert.InRange(decoded.Problems.Count, 0, 18);
        Assert.Equal(
            FitDecoder.CheckCompleteness(file) == FitCompleteness.Suspect || decoded.Problems.Any(problem => problem.Severity == ProblemSeverity.Error),
            decoded.Problems.Any(problem => problem.Reason.Length > 0 && !IsAboutBeats(problem)));
        Assert.All(decoded.Problems, problem => Assert.InRange(problem.ByteOffset!.Value, 0, file.Length));
        foreach (var recording in decoded.Recordings)
            IsSound(recording);
    }

    private static bool IsAboutBeats(Problem problem) => problem.Reason.StartsWith("heart beats", StringComparison.Ordinal);

    private static void IsSound(Recording recording)
    {
        Assert.True(recording.LateHeartRates.All(beat => beat.BeatsPerMinute is > 0 and < 255));
        Assert.True(recording.BeatIntervals.All(interval => interval is > 0 and < 65535));
        Assert.True(recording.Pauses.All(pause => pause.End is null || pause.End > pause.Start));
        foreach (var channel in recording.Samples.Channels)
        {
            foreach (var value in recording.Samples[channel])
                Assert.True(double.IsNaN(value) || Math.Abs(value) < 1e20, $"{channel} {value}");
        }
    }
}
