using LoadWatch.Decoding.References;
using LoadWatch.Recordings;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>What lies before the end of a file that was cut off may be used, and is true; what is damaged otherwise is refused all the same.</summary>
public class FitSalvageTests
{
    public static TheoryData<int> Numbers => [.. Enumerable.Range(0, 12)];

    [Theory]
    [MemberData(nameof(Numbers))]
    public void AFileCutAnywhereGivesTheBeginningOfWhatTheWholeGives(int number)
    {
        var file = Forward(number);
        var whole = Assert.Single(FitDecoder.Decode(file).Recordings);
        for (var length = 0; length < file.Length; length++)
        {
            var decoded = FitDecoder.Decode(file.AsMemory(0, length), salvages: true);
            var problem = Assert.Single(decoded.Problems);
            if (decoded.Recordings.Count == 0)
                continue;

            Assert.Equal(ProblemSeverity.Warning, problem.Severity);
            Assert.Contains("what lies before is used", problem.Reason, StringComparison.Ordinal);
            IsBeginning(Assert.Single(decoded.Recordings), whole);
        }

        Assert.Equal(whole.Samples.Count, FitDecoder.Decode(file.AsMemory(0, file.Length - 1), salvages: true).Recordings.Sum(recording => recording.Samples.Count));
    }

    [Theory]
    [MemberData(nameof(Numbers))]
    public void AChangedBitGivesNothingThatIsNotTrue(int number)
    {
        var file = Forward(number);
        var whole = Assert.Single(FitDecoder.Decode(file).Recordings);
        for (var bit = 0; bit < file.Length * 8; bit += 1 + (number % 3))
        {
            var bytes = file.ToArray();
            bytes[bit / 8] ^= (byte)(1 << (bit % 8));
            foreach (var recording in FitDecoder.Decode(bytes, salvages: true).Recordings)
                IsBeginning(recording, whole);
        }
    }

    [Fact]
    public void ACutFileStatesWhatItLacks()
    {
        var file = Parts.Begin().DefineRecord().Message(0, Parts.Base, 90).Message(0, Parts.Base + 1, 91).ToBytes();
        var recording = Assert.Single(FitDecoder.Decode(file.AsMemory(0, file.Length - 3), salvages: true).Recordings);
        Assert.Equal([90], recording.Samples[Channel.HeartRate]);
        Assert.StartsWith("cut short", recording.CutOff, StringComparison.Ordinal);
        Assert.Null(Assert.Single(FitDecoder.Decode(file, salvages: true).Recordings).CutOff);
    }

    [Fact]
    public void ARecordingThatWasNeverClosedIsReadToItsEnd()
    {
        var file = Parts.Begin(style: FitHeaderStyle.TwelveBytes).DefineRecord().Message(0, Parts.Base, 90).Message(0, Parts.Base + 1, 91).ToBytes();
        file.AsSpan(4, 4).Clear();
        Assert.Empty(FitDecoder.Decode(file).Recordings);
        var recording = Assert.Single(FitDecoder.Decode(file, salvages: true).Recordings);
        Assert.Equal([90, 91], recording.Samples[Channel.HeartRate]);
        Assert.Contains("never closed", recording.CutOff, StringComparison.Ordinal);
    }

    [Fact]
    public void BytesMissingInTheMiddleAreRefused()
    {
        var part = Parts.Begin().Define(0, new(20, new(253, Unsigned32), new(3, Unsigned8), new(5, Unsigned32)));
        for (var second = 0; second < 50; second++)
            part.Message(0, Parts.Base + second, 90, second * 300);

        var file = part.ToBytes();
        for (var missing = 1; missing < 10; missing++)
        {
            byte[] shorter = [.. file[..200], .. file[(200 + missing)..]];
            Assert.Empty(FitDecoder.Decode(shorter, salvages: true).Recordings);
        }
    }

    [Fact]
    public void AWrongChecksumIsRefused() => Assert.Empty(FitDecoder.Decode(FitVectors.Get("v11"), salvages: true).Recordings);

    [Fact]
    public void AWholePartBeforeOneThatWasCutOffCountsAsItIs()
    {
        byte[] file = [.. Parts.Activity(), .. Parts.Activity(heartRate: 140)];
        var decoded = FitDecoder.Decode(file.AsMemory(0, file.Length - 4), salvages: true);
        Assert.Equal([false, true], decoded.Recordings.Select(recording => recording.CutOff is not null));
    }

    /// <summary>A generated file of one recording whose time runs forward, as that of nearly every device does.</summary>
    private static byte[] Forward(int number) =>
        Enumerable.Range(number * 100, 100).Select(candidate => GeneratedPart.Make(candidate, GeneratedStyle.Usual)).First(file =>
            FitDecoder.Decode(file) is { Recordings: [{ Samples.Count: > 5 }] } decoded
            && FitDecoder.Decode(file.AsMemory(0, file.Length - 1), salvages: true).Recordings.Count == 1
            && decoded.Problems.Count == 0);

    private static void IsBeginning(Recording part, Recording whole)
    {
        var rows = part.Samples.Count;
        Assert.InRange(rows, 0, whole.Samples.Count);
        Assert.Equal(whole.Samples.UnixMilliseconds[..rows], part.Samples.UnixMilliseconds);
        foreach (var channel in part.Samples.Channels)
            Assert.Equal(whole.Samples[channel][..rows], part.Samples[channel]);

        Assert.Equal(whole.Sets.Take(part.Sets.Count), part.Sets);
        Assert.Equal(whole.BeatIntervals.Take(part.BeatIntervals.Count), part.BeatIntervals);
    }
}
