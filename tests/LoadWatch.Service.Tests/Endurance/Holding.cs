using System.Diagnostics;

namespace LoadWatch.Service.Tests.Endurance;

/// <summary>What this process holds after everything that can be collected was.</summary>
/// <param name="ManagedMegabytes">Live objects.</param>
/// <param name="NativeMegabytes">What native code has taken of the allocator and not given back, the database engine and the drawing library among it; null where the system does not tell.</param>
/// <param name="WorkingSetMegabytes">
/// Resident memory: the two above, what the collector and the allocator keep in reserve, compiled code, libraries. The collector takes and gives back regions of 4 MB.
/// </param>
/// <param name="Handles">Open files and the like; 0 where the system does not list them.</param>
public sealed record Holding(int Night, double ManagedMegabytes, double? NativeMegabytes, double WorkingSetMegabytes, int Handles, int Threads)
{
    private const double Mega = 1024 * 1024;

    public static Holding Now(int night)
    {
        for (var round = 0; round < 2; round++)
        {
            GC.Collect(GC.MaxGeneration, GCCollectionMode.Aggressive, blocking: true, compacting: true);
            GC.WaitForPendingFinalizers();
        }

        var live = GC.GetTotalMemory(forceFullCollection: true);
        using var self = Process.GetCurrentProcess();
        return new Holding(
            night,
            live / Mega,
            NativeHeap.Bytes() / Mega,
            self.WorkingSet64 / Mega,
            Directory.Exists("/proc/self/fd") ? Directory.GetFileSystemEntries("/proc/self/fd").Length : 0,
            self.Threads.Count);
    }

    /// <summary>The slope of the least-squares line through a value over the nights, per 100 nights.</summary>
    public static double GrowthPer100Nights(IReadOnlyList<Holding> samples, Func<Holding, double> value)
    {
        var (nights, values) = (samples.Average(sample => sample.Night), samples.Average(value));
        var sxy = samples.Sum(sample => (sample.Night - nights) * (value(sample) - values));
        return 100 * sxy / samples.Sum(sample => (sample.Night - nights) * (sample.Night - nights));
    }
}
