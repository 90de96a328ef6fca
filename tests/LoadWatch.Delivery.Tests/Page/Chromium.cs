using System.Diagnostics;

namespace LoadWatch.Delivery.Tests.Page;

/// <summary>A browser without a window that draws a page into a picture.</summary>
internal static class Chromium
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

    private static async Task Run(string[] arguments, CancellationToken token)
    {
        using var process = Process.Start(new ProcessStartInfo(Executable, arguments) { UseShellExecute = false, RedirectStandardError = true, RedirectStandardOutput = true })!;
        var errors = process.StandardError.ReadToEndAsync(token);
        await process.StandardOutput.ReadToEndAsync(token);
        await process.WaitForExitAsync(token);
        Assert.True(process.ExitCode == 0, await errors);
    }
}
