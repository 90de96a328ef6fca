using System.Diagnostics;
using System.Text.Json;

namespace LoadWatch.Delivery.Tests.Looks;

/// <summary>Chromium, driven by playwright-core (npm) and with axe-core in it: one run for all the pages. The packages come from the lock file in tests/References.</summary>
internal static class Browser
{
    private const string Executable = "/usr/bin/chromium";

    private static readonly JsonSerializerOptions Json = new(JsonSerializerDefaults.Web);
    private static readonly string References = Path.Combine(Root(), "tests", "References");

    /// <summary>Where LOADWATCH_BROWSER is <c>required</c>, one that is missing is a failure.</summary>
    public static void SkipUnlessThere()
    {
        var there = File.Exists(Executable) && Directory.Exists(Path.Combine(References, "node_modules", "playwright-core")) && Directory.Exists(Path.Combine(References, "node_modules", "axe-core"));
        const string reason = "chromium, playwright-core or axe-core is not on this machine (npm ci in tests/References)";
        Assert.True(there || Environment.GetEnvironmentVariable("LOADWATCH_BROWSER") != "required", reason);
        Assert.SkipUnless(there, reason);
    }

    /// <summary>Looks at pages by name. Where LOADWATCH_LOOKS names a folder, its pictures and prints stay there.</summary>
    public static IReadOnlyList<Look> LookAt(IReadOnlyDictionary<string, string> pages)
    {
        var kept = Environment.GetEnvironmentVariable("LOADWATCH_LOOKS");
        var folder = kept is null ? Directory.CreateTempSubdirectory("loadwatch-browser-") : Directory.CreateDirectory(kept);
        try
        {
            foreach (var (name, html) in pages)
            {
                File.WriteAllText(Path.Combine(folder.FullName, $"{name}.html"), html);
            }

            return [.. Run([Path.Combine(References, "look.mjs"), Executable, folder.FullName, .. pages.Keys]).Select(line => JsonSerializer.Deserialize<Look>(line, Json)!)];
        }
        finally
        {
            if (kept is null)
            {
                folder.Delete(recursive: true);
            }
        }
    }

    private static string[] Run(string[] arguments)
    {
        using var process = Process.Start(new ProcessStartInfo("node", arguments) { UseShellExecute = false, RedirectStandardError = true, RedirectStandardOutput = true })!;
        var errors = process.StandardError.ReadToEndAsync();
        var lines = process.StandardOutput.ReadToEnd().Split('\n', StringSplitOptions.RemoveEmptyEntries);
        process.WaitForExit();
        Assert.True(process.ExitCode == 0, errors.GetAwaiter().GetResult());
        return lines;
    }

    private static string Root()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (!File.Exists(Path.Combine(folder!.FullName, "LoadWatch.sln")))
        {
            folder = folder.Parent;
        }

        return folder.FullName;
    }
}

/// <summary>One page at one size in one colour scheme, or on paper.</summary>
/// <param name="Size"><c>phone</c>, <c>desk</c>, <c>paper</c>.</param>
/// <param name="Width">What the window shows, dots.</param>
/// <param name="Scrolled">How wide the page is, dots.</param>
/// <param name="Beyond">Elements that reach beyond the window.</param>
/// <param name="Faults">What axe-core calls serious or critical.</param>
/// <param name="Paper">Colour of the background.</param>
/// <param name="Smallest">Size of the smallest letters, dots.</param>
/// <param name="Sheets">Of A4; 0 on a screen.</param>
internal sealed record Look(
    string Page, string Size, string? Colours, int Width, int Scrolled, IReadOnlyList<string> Beyond, IReadOnlyList<Picture> Pictures, IReadOnlyList<string> Faults, string? Paper, double Smallest, int Sheets);

/// <param name="Drawn">Rectangles of a drawing, dots across of a bitmap.</param>
internal sealed record Picture(string Words, double Width, double Height, double Drawn);
