using System.Diagnostics;
using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;

namespace LoadWatch.Delivery.Tests.Page;

/// <summary>A browser without a window that draws a page into a picture.</summary>
internal static partial class Chromium
{
    private const string Executable = "/usr/bin/chromium";

    public static bool Exists => File.Exists(Executable);

    /// <param name="dark">What the page is told about the reader's preference.</param>
    public static async Task<byte[]> Picture(string pagePath, int width, int height, bool dark, CancellationToken token)
    {
        var folder = Directory.CreateTempSubdirectory("loadwatch-browser-");
        try
        {
            var picture = Path.Combine(folder.FullName, "page.png");
            await Run(
                [
                    "--headless", "--no-sandbox", "--disable-gpu", "--no-first-run", "--disable-background-networking", "--disable-component-update",
                    "--disable-sync", "--hide-scrollbars", $"--user-data-dir={folder.FullName}", $"--blink-settings=preferredColorScheme={(dark ? 0 : 1)}",
                    $"--screenshot={picture}", $"--window-size={width},{height}", new Uri(pagePath).AbsoluteUri,
                ],
                token);
            return await File.ReadAllBytesAsync(picture, token);
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    /// <summary>How many sheets of paper the page takes.</summary>
    public static async Task<int> Sheets(string pagePath, CancellationToken token)
    {
        var folder = Directory.CreateTempSubdirectory("loadwatch-browser-");
        try
        {
            var paper = Path.Combine(folder.FullName, "page.pdf");
            await Run(
                [
                    "--headless", "--no-sandbox", "--disable-gpu", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync",
                    $"--user-data-dir={folder.FullName}", "--no-pdf-header-footer", $"--print-to-pdf={paper}", new Uri(pagePath).AbsoluteUri,
                ],
                token);

            // The tree of pages stands uncompressed in what this browser writes; its root counts them.
            var written = Encoding.Latin1.GetString(await File.ReadAllBytesAsync(paper, token));
            return PageCounts().Matches(written).Max(count => int.Parse(count.Groups[1].Value, CultureInfo.InvariantCulture));
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    [GeneratedRegex("/Type /Pages\\s+/Count ([0-9]+)")]
    private static partial Regex PageCounts();

    private static async Task Run(string[] arguments, CancellationToken token)
    {
        using var process = Process.Start(new ProcessStartInfo(Executable, arguments) { UseShellExecute = false, RedirectStandardError = true, RedirectStandardOutput = true })!;
        var errors = process.StandardError.ReadToEndAsync(token);
        await process.StandardOutput.ReadToEndAsync(token);
        await process.WaitForExitAsync(token);
        Assert.True(process.ExitCode == 0, await errors);
    }
}
