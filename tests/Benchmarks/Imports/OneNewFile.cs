using System.Globalization;
using LoadWatch.Service.Commands;
using NodaTime;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>
/// One new recording of yesterday, in a process that has swept for a while as the service does: what its sweep takes beyond a sweep with nothing new at the same
/// moment. A process of its own, so that it can run under strace: paths that do not exist mark where the sweep begins and ends.
/// </summary>
internal static class OneNewFile
{
    public const string Begin = "/one new file/begin";
    public const string End = "/one new file/end";

    private const int WarmUp = 100;
    private const int Measured = 15;

    /// <summary>Prints, for each measured morning, milliseconds of processor and rows read of both sweeps.</summary>
    public static int Run(Squad squad)
    {
        using var workplace = Workplace.OpenToWork(squad.ConfigPath);
        for (var morning = 1; morning <= WarmUp + Measured; morning++)
        {
            var yesterday = squad.LastDate.PlusDays(morning);
            var now = squad.Morning + Duration.FromDays(morning);
            workplace.NewSweep(now).Run();
            var empty = Sweep(workplace, now + Duration.FromMinutes(1));
            squad.Add(0, yesterday);
            _ = File.Exists(Begin);
            var full = Sweep(workplace, now + Duration.FromMinutes(2));
            _ = File.Exists(End);
            if (morning > WarmUp)
            {
                Console.Out.WriteLine(string.Create(
                    CultureInfo.InvariantCulture, $"{full.CpuMilliseconds} {empty.CpuMilliseconds} {full.Rows} {empty.Rows}"));
            }
        }

        return 0;
    }

    private static (double CpuMilliseconds, long Rows) Sweep(Workplace workplace, Instant now)
    {
        GC.Collect();
        var before = workplace.Store.RowsRead;
        var cost = Cost.Of(() => workplace.NewSweep(now).Run());
        return (cost.CpuSeconds * 1000, workplace.Store.RowsRead - before);
    }
}
