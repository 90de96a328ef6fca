using System.Diagnostics;
using System.Globalization;
using LoadWatch.Decoding.Csv;
using LoadWatch.Decoding.Tests.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Limits;

/// <summary>
/// Reads the worst files in a process whose heap ends at the ceiling (I-11): 64 MB and four times the file, the test runner's own part included.
/// The explicit tests are what the others start there.
/// </summary>
public class MemoryTests
{
    private const long Ceiling = 64L << 20;

    /// <summary>Larger files are refused before they are read.</summary>
    private const int GreatestBytes = 32 << 20;

    // LOADWATCH_LARGE_MB sets how large the file is that is read in flat memory.
    private static readonly int LargeMegabytes = int.Parse(Environment.GetEnvironmentVariable("LOADWATCH_LARGE_MB") ?? "160", CultureInfo.InvariantCulture);

    [Fact]
    public void NoWorstFileTakesMoreThanItsCeiling() => RunLimited(nameof(EveryWorstFileIsRead), Ceiling + (4L * WorstInputs.Bytes));

    [Fact]
    public void NoWorstFitTakesMoreThanItsCeiling() => RunLimited(nameof(EveryWorstFitIsRead), Ceiling + (4L * WorstInputs.Bytes));

    [Fact]
    public void NoWorstFitOfTheGreatestSizeTakesMoreThanItsCeiling() => RunLimited(nameof(EveryGreatestFitIsRead), Ceiling + (4L * GreatestBytes));

    [Fact]
    public void ALargeFileIsReadInFlatMemory() => RunLimited(nameof(ALargeFileIsReadThrough), Ceiling);

    [Fact(Explicit = true)]
    public void EveryWorstFileIsRead()
    {
        Assert.Empty(WorstInputs.All.Where(worst => !IsReadWithin(worst.Make)).Select(worst => worst.Name));
    }

    [Fact(Explicit = true)]
    public void EveryWorstFitIsRead() => Assert.Empty(WorstFits.All.Where(worst => !IsReadWithin(() => worst.Make(WorstInputs.Bytes, WorstFits.Full))).Select(worst => worst.Name));

    [Fact(Explicit = true)]
    public void EveryGreatestFitIsRead() => Assert.Empty(WorstFits.All.Where(worst => !IsReadWithin(() => worst.Make(GreatestBytes, WorstFits.Full))).Select(worst => worst.Name));

    [Fact(Explicit = true)]
    public void ALargeFileIsReadThrough()
    {
        const int people = 10;
        var days = (int)(((long)LargeMegabytes << 20) / new SquadStream(people, 1).Length);
        var layout = new CsvLayout
        {
            Name = "squad",
            Header = ["player"],
            PersonColumn = "player",
            Time = new CsvTimeColumn { Column = "time" },
            Columns = [new() { Column = "speed", Channel = Channel.Speed, Unit = "m/s" }, new() { Column = "heart rate", Channel = Channel.HeartRate, Unit = "bpm" }],
        };
        var (recordings, rows) = (0, 0L);

        var read = CsvDecoder.Read(() => new SquadStream(people, days), [layout], recording =>
        {
            recordings++;
            rows += recording.Samples.Count;
        });

        Assert.Empty(read.File.Problems);
        Assert.Equal((people * days, (long)people * days * SquadStream.RowsOfSession), (recordings, rows));
    }

    /// <summary>
    /// The garbage of its making, and of those before, is no part of what reading takes. On a busy machine the collector has come too late for a file that took 72 MB
    /// of 96: what truly takes too much does so again.
    /// </summary>
    private static bool IsReadWithin(Func<byte[]> make)
    {
        var bytes = make();
        return IsRead() || IsRead();

        bool IsRead()
        {
            GC.Collect(GC.MaxGeneration, GCCollectionMode.Aggressive, blocking: true, compacting: true);
            try
            {
                WorstInputs.Read(bytes);
                return true;
            }
            catch (OutOfMemoryException)
            {
                return false;
            }
        }
    }

    private static void RunLimited(string test, long bytes)
    {
        var start = new ProcessStartInfo(Path.ChangeExtension(typeof(MemoryTests).Assembly.Location, OperatingSystem.IsWindows() ? ".exe" : null))
        {
            UseShellExecute = false,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        start.ArgumentList.Add("-method");
        start.ArgumentList.Add($"{typeof(MemoryTests).FullName}.{test}");
        start.ArgumentList.Add("-explicit");
        start.ArgumentList.Add("only");
        start.Environment["DOTNET_GCHeapHardLimit"] = bytes.ToString("X", CultureInfo.InvariantCulture);
        using var child = Process.Start(start)!;
        var errors = child.StandardError.ReadToEndAsync();
        var output = child.StandardOutput.ReadToEnd();
        child.WaitForExit();
        Assert.True(child.ExitCode == 0 && output.Contains("Failed: 0", StringComparison.Ordinal) && output.Contains("Total: 1,", StringComparison.Ordinal), $"{errors.Result}\n{output}");
    }
}
