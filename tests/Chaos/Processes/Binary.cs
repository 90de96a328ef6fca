using System.Diagnostics;

namespace LoadWatch.Chaos.Processes;

/// <summary>The program under test, always as a process of its own.</summary>
/// <param name="Words">The words that start it: one executable, or <c>dotnet</c> and the assembly.</param>
public sealed record Binary(IReadOnlyList<string> Words)
{
    /// <summary>Names a published executable that is used as it is.</summary>
    public const string Variable = "LOADWATCH_PUBLISHED";

    /// <summary>What <see cref="Variable"/> names, else what was built beside this program.</summary>
    public static Binary Find() => Environment.GetEnvironmentVariable(Variable) is { Length: > 0 } published
        ? At(published)
        : new Binary(["dotnet", Path.Combine(AppContext.BaseDirectory, "loadwatch.dll")]);

    /// <exception cref="FileNotFoundException">There is none.</exception>
    public static Binary At(string executable) =>
        File.Exists(executable) ? new Binary([Path.GetFullPath(executable)]) : throw new FileNotFoundException("there is no such executable", executable);

    /// <summary>Publishes the sources of a repository into a folder, compiled ahead where the packages for that are to be had.</summary>
    /// <exception cref="ChaosFailureException">It does not build.</exception>
    public static Binary Publish(string repository, string folder)
    {
        var sources = Sources.CopyOf(repository, Path.Combine(folder, "sources"));
        var said = "";
        foreach (var ahead in new[] { "true", "false" })
        {
            string[] words =
            [
                "publish", Path.Combine(sources, "src", "LoadWatch.Service"), "-c", "Release", "-r", "linux-x64", "--no-self-contained", "-v", "quiet",
                $"-p:PublishReadyToRun={ahead}", "-p:RestorePackagesWithLockFile=false", "-p:RestoreLockedMode=false", "-o", Path.Combine(folder, "loadwatch"),
            ];
            using var build = Process.Start(new ProcessStartInfo("dotnet", words) { RedirectStandardOutput = true, UseShellExecute = false })!;
            said = build.StandardOutput.ReadToEnd();
            build.WaitForExit();
            if (build.ExitCode == 0)
            {
                return At(Path.Combine(folder, "loadwatch", "loadwatch"));
            }
        }

        throw new ChaosFailureException($"the service does not publish: {said}");
    }
}
