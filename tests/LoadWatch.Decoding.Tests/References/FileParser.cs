using System.Diagnostics;
using System.Text.Json;

namespace LoadWatch.Decoding.References;

/// <summary>
/// fit-file-parser (npm, MIT), run by node over a folder of files. The packages come from the lock file in tests/References: <c>npm ci</c> there.
/// </summary>
internal static class FileParser
{
    private static readonly JsonSerializerOptions Json = new(JsonSerializerDefaults.Web);
    private static readonly string Folder = Path.Combine(Repository.Root, "tests", "References");
    private static readonly Lazy<bool> Runs = new(() => Directory.Exists(Path.Combine(Folder, "node_modules", "fit-file-parser")) && Programs.Has("node"));

    public static void SkipUnlessThere() => Programs.SkipUnless("fit-file-parser", Runs.Value, "node or fit-file-parser is not on this machine (npm ci in tests/References)");

    /// <summary>What it gives of each content, in their order.</summary>
    public static IReadOnlyList<ReferencePart> Read(IReadOnlyList<byte[]> contents)
    {
        var folder = Directory.CreateTempSubdirectory("loadwatch-references");
        try
        {
            for (var i = 0; i < contents.Count; i++)
                File.WriteAllBytes(Path.Combine(folder.FullName, $"{i:D6}.fit"), contents[i]);

            return [.. Programs.Lines("node", [Path.Combine(Folder, "decode.mjs"), folder.FullName]).Select(line => JsonSerializer.Deserialize<ReferencePart>(line, Json)!)];
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }
}

/// <summary>Programs beside the tests.</summary>
internal static class Programs
{
    /// <summary>The one that must run, or <c>required</c> for both.</summary>
    private static readonly string Required = Environment.GetEnvironmentVariable("LOADWATCH_REFERENCES") ?? "";

    /// <summary>Where a reference is required, that it is missing is a failure.</summary>
    public static void SkipUnless(string reference, bool there, string reason)
    {
        Assert.True(there || (Required != "required" && Required != reference), reason);
        Assert.SkipUnless(there, reason);
    }

    public static bool Has(string name) =>
        (Environment.GetEnvironmentVariable("PATH") ?? "").Split(Path.PathSeparator).Any(folder =>
            File.Exists(Path.Combine(folder, name)) || File.Exists(Path.Combine(folder, name + ".exe")));

    /// <summary>What a program prints, line by line; it must end well.</summary>
    public static IReadOnlyList<string> Lines(string name, IReadOnlyList<string> words) =>
        TryLines(name, words) ?? throw new InvalidOperationException($"{name} failed");

    /// <summary>What a program prints, line by line; null where it fails.</summary>
    public static IReadOnlyList<string>? TryLines(string name, IReadOnlyList<string> words)
    {
        using var process = Process.Start(new ProcessStartInfo(name, words) { RedirectStandardOutput = true, RedirectStandardError = true, UseShellExecute = false })!;
        process.ErrorDataReceived += (_, _) => { };
        process.BeginErrorReadLine();
        var lines = process.StandardOutput.ReadToEnd().Split(['\r', '\n'], StringSplitOptions.RemoveEmptyEntries);
        process.WaitForExit();
        return process.ExitCode == 0 ? lines : null;
    }
}

/// <summary>The folder that holds the solution.</summary>
internal static class Repository
{
    public static string Root { get; } = Find();

    private static string Find()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (!File.Exists(Path.Combine(folder!.FullName, "LoadWatch.sln")))
            folder = folder.Parent;

        return folder.FullName;
    }
}
