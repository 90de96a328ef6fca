using System.Diagnostics;
using System.Text.RegularExpressions;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Arrivals;

/// <summary>I-2 as the kernel sees it: the order of the calls by which one file is taken in.</summary>
public sealed partial class DurabilityOrderTests : IDisposable
{
    private readonly WorkingFolder folder = new(take: "move");

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ACopyIsDurableBeforeItIsNamedAndNamedBeforeItIsCommitted()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux() && CanTrace(), "strace is not here or may not trace");
        var ride = folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        var sha = folder.InboxHashes()[0];
        var calls = Traced();
        var copied = Find(calls, 0, call => Is(call, "fsync", "/archive/incoming/"));
        var named = Find(calls, copied, call => Is(call, "renameat2", "/archive/incoming/") && call.Contains($"/archive/{sha[..2]}/{sha}", StringComparison.Ordinal));
        var folderSynced = Find(calls, named, call => Is(call, "fsync", $"/archive/{sha[..2]}>"));
        var waiting = Find(calls, folderSynced, IsDatabaseSync);
        var settled = Find(calls, waiting, IsDatabaseSync);
        Find(calls, settled, call => Is(call, "renameat2", ride) || Is(call, "unlink", "/.loadwatch-"));
        Assert.DoesNotContain(calls[..settled], call => Is(call, "rename", ride) || Is(call, "unlink", ride));
        Assert.DoesNotContain(calls[copied..folderSynced], IsDatabaseSync);
        Assert.DoesNotContain(calls, call => call.Contains(ride, StringComparison.Ordinal) && Writing().IsMatch(call));
        Assert.Contains(calls, call => call.Contains(ride, StringComparison.Ordinal) && call.Contains("O_RDONLY", StringComparison.Ordinal) && call.Contains("O_NOFOLLOW", StringComparison.Ordinal));
    }

    /// <summary>Calls in the order in which they began; file numbers are followed by their paths.</summary>
    private List<string> Traced()
    {
        var log = Path.Combine(folder.Root, "trace.txt");
        string[] strace = ["strace", "-f", "-y", "-s", "400", "-e", "trace=openat,open,creat,fsync,fdatasync,rename,renameat,renameat2,unlink,unlinkat,truncate", "-o", log];
        var ended = Loadwatch.RunUnder(strace, "sweep", "--config", folder.ConfigPath, "--as-of", WorkingFolder.NowText);
        Assert.True(ended.Code == 0, ended.Output + ended.Errors);
        return [.. File.ReadLines(log).Where(line => line.Contains(folder.Root, StringComparison.Ordinal) && !line.Contains("resumed>", StringComparison.Ordinal))];
    }

    private static int Find(List<string> calls, int from, Predicate<string> wanted)
    {
        var at = calls.FindIndex(from, wanted);
        Assert.True(at >= 0, $"not found behind call {from} of{Environment.NewLine}{string.Join(Environment.NewLine, calls)}");
        return at + 1;
    }

    private static bool Is(string call, string name, string path) =>
        call.Contains($" {name}", StringComparison.Ordinal) && call.Contains(path, StringComparison.Ordinal);

    private static bool IsDatabaseSync(string call) =>
        (Is(call, "fsync(", "/loadwatch.db-wal>") || Is(call, "fdatasync(", "/loadwatch.db-wal>")) && !call.Contains("ENOENT", StringComparison.Ordinal);

    private static bool CanTrace()
    {
        try
        {
            using var tried = Process.Start(new ProcessStartInfo("strace", ["-o", "/dev/null", "true"]) { RedirectStandardError = true, UseShellExecute = false })!;
            tried.WaitForExit();
            return tried.ExitCode == 0;
        }
        catch (System.ComponentModel.Win32Exception)
        {
            return false;
        }
    }

    [GeneratedRegex("O_WRONLY|O_RDWR|O_CREAT|O_TRUNC|truncate|creat\\(", RegexOptions.None, matchTimeoutMilliseconds: 1000)]
    private static partial Regex Writing();
}
