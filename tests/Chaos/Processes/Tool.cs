using System.Diagnostics;

namespace LoadWatch.Chaos.Processes;

/// <summary>Programs of the machine.</summary>
public static class Tool
{
    private static readonly Lazy<bool> Tracing = new(() => OperatingSystem.IsLinux() && IsThere("strace") && Run("strace", "-f", "--seccomp-bpf", "-e", "trace=fsync", "-o", "/dev/null", "true"));

    private static readonly Lazy<bool> Mounting = new(() => OperatingSystem.IsLinux() && IsThere("unshare") && Run("unshare", "-m", "true"));

    public static bool CanTrace => Tracing.Value;

    /// <summary>Whether a child may have a mount namespace of its own.</summary>
    public static bool CanMount => Mounting.Value;

    public static bool IsThere(string name) => (Environment.GetEnvironmentVariable("PATH") ?? "")
        .Split(Path.PathSeparator)
        .Any(folder => File.Exists(Path.Combine(folder, name)));

    /// <summary>Whether it ended with 0.</summary>
    public static bool Run(string program, params IEnumerable<string> words)
    {
        using var process = Process.Start(new ProcessStartInfo(program, words) { UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true })!;
        process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        return process.ExitCode == 0;
    }
}
