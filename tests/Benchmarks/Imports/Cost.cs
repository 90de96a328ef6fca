using System.Diagnostics;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>What a piece of work took.</summary>
/// <param name="Seconds">By the clock.</param>
/// <param name="CpuSeconds">Of all threads, system calls among it.</param>
/// <param name="PeakMegabytes">Most resident memory of the process that did it, all that came before in that process included.</param>
internal sealed record Cost(double Seconds, double CpuSeconds, double PeakMegabytes)
{
    private const double Mega = 1024 * 1024;

    /// <summary>Of work in this process.</summary>
    public static Cost Of(Action work)
    {
        var cpu = Environment.CpuUsage.TotalTime;
        var clock = Stopwatch.StartNew();
        work();
        var seconds = clock.Elapsed.TotalSeconds;
        using var self = Process.GetCurrentProcess();
        return new Cost(seconds, (Environment.CpuUsage.TotalTime - cpu).TotalSeconds, self.PeakWorkingSet64 / Mega);
    }

    /// <summary>Of a process of its own, looked at every few milliseconds: processor time of its last moment may be missing.</summary>
    public static (Cost Cost, string Output) OfProcess(params string[] line)
    {
        var clock = Stopwatch.StartNew();
        using var process = Process.Start(new ProcessStartInfo(line[0], line[1..]) { UseShellExecute = false, RedirectStandardOutput = true })!;
        var output = process.StandardOutput.ReadToEndAsync();
        var (cpu, peak) = (TimeSpan.Zero, 0L);
        while (!process.WaitForExit(10))
        {
            try
            {
                process.Refresh();
                (cpu, peak) = (process.TotalProcessorTime, Math.Max(peak, process.PeakWorkingSet64));
            }
            catch (InvalidOperationException)
            {
                // Ended between the two questions.
            }
        }

        if (process.ExitCode != 0)
        {
            throw new InvalidOperationException($"{string.Join(' ', line)} ended with {process.ExitCode}: {output.Result}");
        }

        return (new Cost(clock.Elapsed.TotalSeconds, cpu.TotalSeconds, peak / Mega), output.Result);
    }
}
