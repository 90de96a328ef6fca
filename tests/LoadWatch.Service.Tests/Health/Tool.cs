using System.Diagnostics;

namespace LoadWatch.Service.Tests.Health;

/// <summary>A program of the machine that a test needs, run to its end.</summary>
internal static class Tool
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(90);

    public static bool IsThere(string name) => (Environment.GetEnvironmentVariable("PATH") ?? "")
        .Split(Path.PathSeparator)
        .Any(folder => File.Exists(Path.Combine(folder, name)));

    /// <summary>Exit code, and output with errors.</summary>
    public static async Task<(int Code, string Text)> Run(string program, params string[] words)
    {
        var start = new ProcessStartInfo(program, words) { UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true };
        using var process = Process.Start(start)!;
        using var patience = CancellationTokenSource.CreateLinkedTokenSource(TestContext.Current.CancellationToken);
        patience.CancelAfter(Patience);
        try
        {
            var text = await Task.WhenAll(process.StandardOutput.ReadToEndAsync(patience.Token), process.StandardError.ReadToEndAsync(patience.Token));
            await process.WaitForExitAsync(patience.Token);
            return (process.ExitCode, string.Concat(text));
        }
        finally
        {
            if (!process.HasExited)
            {
                process.Kill(entireProcessTree: true);
            }
        }
    }
}
