using System.Globalization;
using LoadWatch.Service.Commands;
using NodaTime;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>Sweeps that find nothing new, one after the other in one process as the service does. Prints seconds, processor seconds and peak memory of each.</summary>
internal static class NothingNew
{
    private const int Sweeps = 4;

    public static int Run(Squad squad)
    {
        using var workplace = Workplace.OpenToWork(squad.ConfigPath);
        for (var minute = 0; minute < Sweeps; minute++)
        {
            var cost = Cost.Of(() => workplace.NewSweep(squad.Morning + Duration.FromMinutes(minute)).Run());
            Console.Out.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{cost.Seconds} {cost.CpuSeconds} {cost.PeakMegabytes}"));
        }

        return 0;
    }
}
