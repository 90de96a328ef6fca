using System.Diagnostics;
using System.Security.Cryptography;
using LoadWatch.Decoding.Fit;

namespace LoadWatch.Benchmarks;

/// <summary>
/// Decoding FIT files to channels against the least that reading them takes, against hashing them, and against fit-file-parser (npm, MIT) on the same bytes: the
/// least times of many rounds in one run, as a table for the README. Fails where a bound of its heads is missed. Real files are read where LOADWATCH_REAL_FIT names a folder of them.
/// </summary>
internal static class DecodeTable
{
    public const string Name = "decode";

    private const int Rounds = 100;
    private const int ParserRounds = 5;
    private const double Mega = 1e6;
    private static readonly TimeSpan WarmUp = TimeSpan.FromSeconds(2);

    public static int Run()
    {
        Console.Out.WriteLine("| files | size | decoded at | time to the floor's (at most 3) | rate to SHA-256's (at least 0.2) | rate to fit-file-parser's (at least 40) | allocated to the channels (under 1.2) |");
        Console.Out.WriteLine("| --- | --- | --- | --- | --- | --- | --- |");
        var holds = Row("three hours at 1 Hz, twelve fields", [LongRide.FileOfTwelveFields()])
            & Row("the same with two developer fields", [LongRide.FileWithDeveloperFields()])
            & (RealFiles() is not { Count: > 0 } real || Row("real files of many devices", real));
        return holds ? 0 : 1;
    }

    private static List<byte[]> RealFiles() =>
        Environment.GetEnvironmentVariable("LOADWATCH_REAL_FIT") is { Length: > 0 } folder
            ? [.. Directory.EnumerateFiles(folder, "*.fit", SearchOption.AllDirectories).Order(StringComparer.Ordinal).Select(File.ReadAllBytes).Where(IsWhole)]
            : [];

    private static bool IsWhole(byte[] file) => FitDecoder.CheckCompleteness(file) == FitCompleteness.Complete;

    /// <summary>Whether all four bounds hold; the last but one where fit-file-parser is there.</summary>
    private static bool Row(string what, List<byte[]> files)
    {
        Warm(files);
        var decode = Least(files, file => FitDecoder.Decode(file));
        var hash = Least(files, file => SHA256.HashData(file));
        var (floor, decodeOfThose) = ToFloor(files);
        var (allocated, channels) = Memory(files);
        var megabytes = files.Sum(file => file.Length) / Mega;
        var toParser = ParserSeconds(files) / decode;
        var parser = toParser is { } ratio ? FormattableString.Invariant($"{ratio:0}") : "not on this machine";
        Console.Out.WriteLine(FormattableString.Invariant(
            $"| {what} ({files.Count}) | {megabytes:0.0} MB | {megabytes / decode:0} MB/s | {decodeOfThose / floor:0.00} | {hash / decode:0.00} | {parser} | {allocated / channels:0.00} |"));
        return decodeOfThose / floor <= 3 && hash / decode >= 0.2 && (toParser is null or >= 40) && allocated / channels < 1.2;
    }

    /// <summary>Reads until the code has been compiled for speed.</summary>
    private static void Warm(List<byte[]> files)
    {
        for (var start = Stopwatch.GetTimestamp(); Stopwatch.GetElapsedTime(start) < WarmUp;)
        {
            foreach (var file in files)
                FitDecoder.Decode(file);
        }
    }

    /// <summary>Seconds for all files, the sum of each one's least of many rounds.</summary>
    private static double Least(IEnumerable<byte[]> files, Action<byte[]> read) => files.Sum(file => Enumerable.Range(0, Rounds).Min(_ =>
    {
        var start = Stopwatch.GetTimestamp();
        read(file);
        return Stopwatch.GetElapsedTime(start).TotalSeconds;
    }));

    /// <summary>Of the files that the plain walk of the floor can follow: one part, no compressed times.</summary>
    private static (double Floor, double Decode) ToFloor(IEnumerable<byte[]> files)
    {
        var floor = new RecordFloor(1 << 17);
        var followed = files.Where(file => Follows(floor, file)).ToList();
        return (Least(followed, file => floor.Run(file)), Least(followed, file => FitDecoder.Decode(file)));
    }

    private static bool Follows(RecordFloor floor, byte[] file)
    {
        try
        {
            return floor.Run(file) >= 0;
        }
        catch (Exception exception) when (exception is InvalidDataException or IndexOutOfRangeException or ArgumentOutOfRangeException or NullReferenceException or OverflowException)
        {
            return false;
        }
    }

    /// <summary>What decoding allocates, and 8 bytes for each value and time of the channels that it returns.</summary>
    private static (double Allocated, double Channels) Memory(IEnumerable<byte[]> files)
    {
        var (allocated, channels) = (0L, 0L);
        foreach (var file in files)
        {
            var before = GC.GetAllocatedBytesForCurrentThread();
            var decoded = FitDecoder.Decode(file);
            allocated += GC.GetAllocatedBytesForCurrentThread() - before;
            channels += decoded.Recordings.Sum(recording => 8L * recording.Samples.Count * (1 + recording.Samples.Channels.Count()));
        }

        return (allocated, channels);
    }

    /// <summary>Seconds that node takes for one more reading of all files; null where node or the package is missing.</summary>
    private static double? ParserSeconds(List<byte[]> files)
    {
        if (Script() is not { } script)
            return null;

        var folder = Directory.CreateTempSubdirectory("loadwatch-decode");
        try
        {
            for (var i = 0; i < files.Count; i++)
                File.WriteAllBytes(Path.Combine(folder.FullName, FormattableString.Invariant($"{i:D4}.fit")), files[i]);

            return (Seconds(script, folder.FullName, ParserRounds + 1) - Seconds(script, folder.FullName, 1)) / ParserRounds;
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    private static string? Script()
    {
        var references = Path.Combine("tests", "References");
        return Directory.Exists(Path.Combine(references, "node_modules", "fit-file-parser")) ? Path.Combine(references, "decode.mjs") : null;
    }

    private static double Seconds(string script, string folder, int rounds)
    {
        var start = Stopwatch.GetTimestamp();
        using var node = Process.Start(new ProcessStartInfo("node", [script, folder, FormattableString.Invariant($"{rounds}")]) { RedirectStandardOutput = true, UseShellExecute = false })!;
        node.StandardOutput.ReadToEnd();
        node.WaitForExit();
        return node.ExitCode == 0 ? Stopwatch.GetElapsedTime(start).TotalSeconds : throw new InvalidOperationException("node failed");
    }
}
