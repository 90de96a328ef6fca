using System.Globalization;
using System.Text;
using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Arrivals;

/// <summary>A CSV that is too large to be held gives what the same rows give in a small file (I-11).</summary>
public sealed class LargeTextTests : IDisposable
{
    private const long HeapBytes = 192L * 1024 * 1024;

    private static readonly byte[] Small = Some.Csv(Some.Yesterday);
    private static readonly byte[] Large = Widened(Small, LargeText.HeldBytes);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ItGivesTheSameDays()
    {
        using var held = new WorkingFolder();
        held.Put("anna/ride.csv", Small);
        folder.Put("anna/ride.csv", Large);
        Assert.True(Large.Length > LargeText.HeldBytes);

        held.Sweep();
        folder.Sweep();

        Assert.Equal((ArrivalState.Stored, "anna", (long)Large.Length), (Stored.State, Stored.Person, Stored.Size));
        Assert.Contains("\"person\":\"anna\"", folder.Export("days"), StringComparison.Ordinal);
        Assert.Equal(held.Export("days"), folder.Export("days"));
        Assert.Equal(WorkingFolder.Sha(Large), Assert.Single(folder.ArchiveHashes()));
    }

    [Fact]
    public void ItIsComputedAgainFromTheArchive()
    {
        folder.Put("anna/ride.csv", Large);
        folder.Sweep();
        var before = folder.Export();
        folder.Rebuild();
        Assert.Equal(before, folder.Export());
    }

    [Fact]
    public void ItIsReadBackWhereItIsMergedWithAnother()
    {
        using var held = new WorkingFolder();
        foreach (var (place, csv) in new[] { (held, Small), (folder, Large) })
        {
            place.Put("anna/ride.csv", csv);
            place.Sweep();
            place.Put("anna/ride.fit", Some.Fit(Some.Yesterday, 1));
            place.Sweep();
        }

        Assert.Equal(held.Export("days"), folder.Export("days"));
        Assert.Equal(2, folder.Arrivals().Count(arrival => arrival.State == ArrivalState.Stored));
    }

    [Fact]
    public void ADamagedOriginalOfItIsNotRead()
    {
        folder.Put("anna/ride.csv", Large);
        folder.Sweep();
        var original = Assert.Single(WorkingFolder.Files(Path.Combine(folder.Data, "archive")), path => Path.GetFileName(path) == WorkingFolder.Sha(Large));
        using (var file = File.OpenWrite(original))
        {
            file.Position = Large.Length - 2;
            file.WriteByte((byte)'y');
        }

        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday, 1));
        folder.Sweep();

        var remark = $"computed without session 1 of {WorkingFolder.Sha(Large)[..12]}: its original in the archive is missing or damaged";
        Assert.Contains(remark, folder.Export("activities"), StringComparison.Ordinal);
    }

    [Fact]
    public void AboveItsOwnLimitItStaysWhereItIs()
    {
        using var limited = new WorkingFolder(intake: "\"largest_csv_megabytes\": 1, \"largest_file_megabytes\": 512");
        limited.Put("anna/ride.csv", Widened(Small, 1024 * 1024));
        limited.Put("anna/small.csv", Small);
        Assert.Equal(new BriefLine("anna/ride.csv", "larger than 1 MB"), Assert.Single(limited.Sweep().Unreadable));
        Assert.Equal(ArrivalState.Stored, Assert.Single(limited.Arrivals()).State);
    }

    [Fact]
    public void ItMayBeLargerThanOtherFilesMay()
    {
        using var limited = new WorkingFolder(intake: "\"largest_file_megabytes\": 1");
        limited.Put("anna/ride.csv", Widened(Small, 2 * 1024 * 1024));
        Assert.Empty(limited.Sweep().Unreadable);
        Assert.Equal(ArrivalState.Stored, Assert.Single(limited.Arrivals()).State);
    }

    [Fact]
    public void WhileItMayStillGrowItWaits()
    {
        folder.Put("anna/ride.csv", Large, Duration.Zero);
        Assert.Equal((1, 0), (folder.Sweep().Settling, folder.Arrivals().Count));
    }

    /// <summary>The heap of the sweep ends far below the size of the file, which LOADWATCH_LARGE_MB sets.</summary>
    [Fact]
    public void ItIsTakenInByAProcessWhoseHeapIsSmallerThanTheFile()
    {
        var megabytes = int.Parse(Environment.GetEnvironmentVariable("LOADWATCH_LARGE_MB") ?? "256", CultureInfo.InvariantCulture);
        using var large = new WorkingFolder(intake: "\"largest_csv_megabytes\": 4096");
        WriteWide(large.Put("anna/ride.csv", []), megabytes);

        var ended = Loadwatch.Start(["sweep", "--config", large.ConfigPath, "--as-of", WorkingFolder.NowText], environment: ("DOTNET_GCHeapHardLimit", $"{HeapBytes:X}")).WaitForEnd();

        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        Assert.Equal(ArrivalState.Stored, Assert.Single(large.Arrivals()).State);
    }

    private Storage.Recordings.Arrival Stored => Assert.Single(folder.Arrivals());

    /// <summary>The same rows with a column besides that no layout knows.</summary>
    private static byte[] Widened(byte[] csv, long atLeast)
    {
        var lines = Encoding.UTF8.GetString(csv).TrimEnd('\n', '\r').Split('\n').Select(line => line.TrimEnd('\r')).ToList();
        var filling = new string('x', (int)(atLeast / (lines.Count - 1)) + 1);
        return Encoding.UTF8.GetBytes(string.Concat(lines.Select((line, row) => $"{line},{(row == 0 ? "note" : filling)}\n")));
    }

    /// <summary>Nine hundred rows a megabyte, twenty a second, from a midnight on.</summary>
    private static void WriteWide(string path, int megabytes)
    {
        using (var writer = new StreamWriter(path))
        {
            var filling = new string('x', 1_125);
            writer.Write("time,heart_rate_bpm,power_w,note\n");
            var start = (Some.Yesterday.PlusDays(-2) + LocalTime.Midnight).InUtc().ToDateTimeUtc();
            for (var row = 0; row < megabytes * 900; row++)
            {
                writer.Write(string.Create(CultureInfo.InvariantCulture, $"{start.AddMilliseconds(row * 50.0):yyyy-MM-dd'T'HH:mm:ss.fff'Z'},{120 + (row / 1_200 % 40)},{150 + (row / 600 % 90)},{filling}\n"));
            }
        }

        File.SetLastWriteTimeUtc(path, (WorkingFolder.Now - Duration.FromHours(1)).ToDateTimeUtc());
    }
}
