using System.Diagnostics;

namespace LoadWatch.Storage.Tests.Archives;

/// <summary>The order of I-2 as the kernel sees it: one test of this assembly is run again under strace.</summary>
public sealed class ArchiveOrderTests : IDisposable
{
    private const string Traced =
        "LoadWatch.Storage.Tests.Archives.ArchiveTests.ACommittedCopyIsNamedByItsContentAndLeavesNothingBehind";

    private readonly TemporaryFolder temporary = new();

    public void Dispose() => temporary.Dispose();

    [Fact]
    public void ACopyIsDurableBeforeItIsNamedAndItsNameIsDurableLast()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "strace exists on Linux only");
        Assert.SkipUnless(File.Exists("/usr/bin/strace"), "strace is not installed");
        var calls = Trace();
        Assert.SkipWhen(calls.Count == 0, "the system does not allow tracing");

        int[] order =
        [
            IndexOf(calls, "openat(", "/incoming/", "O_CREAT|O_EXCL"),
            IndexOf(calls, "write", "/incoming/", "\"abc\""),
            IndexOf(calls, "fsync(", "/incoming/"),
            IndexOf(calls, "renameat2(", "/archive/ba/ba7816bf", "RENAME_NOREPLACE"),
            IndexOf(calls, "fsync(", "/archive/ba>"),
        ];

        Assert.DoesNotContain(-1, order);
        Assert.Equal(order.Order(), order);
    }

    private static int IndexOf(List<string> calls, params string[] parts) =>
        calls.FindIndex(call => parts.All(part => call.Contains(part, StringComparison.Ordinal)));

    private List<string> Trace()
    {
        var log = temporary.At("calls");
        var program = Path.ChangeExtension(typeof(ArchiveOrderTests).Assembly.Location, null);
        using var strace = Process.Start(new ProcessStartInfo(
            "/usr/bin/strace",
            ["-f", "-y", "-qq", "-s", "200", "-e", "trace=openat,write,pwrite64,fsync,renameat2", "-o", log, program, "-method", Traced])
        {
            UseShellExecute = false,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        })!;
        var errors = strace.StandardError.ReadToEndAsync(TestContext.Current.CancellationToken);
        strace.StandardOutput.ReadToEnd();
        strace.WaitForExit();
        Assert.True(strace.ExitCode == 0 || errors.Result.Contains("ptrace", StringComparison.Ordinal), errors.Result);
        return strace.ExitCode == 0 ? [.. File.ReadLines(log)] : [];
    }
}
