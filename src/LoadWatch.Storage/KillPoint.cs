using System.Globalization;

namespace LoadWatch.Storage;

/// <summary>
/// Named places at which a test may end the process as a power cut would. The variable LOADWATCH_KILL_AT names one, with <c>:n</c> for its n-th passing.
/// Does nothing otherwise.
/// </summary>
public static class KillPoint
{
    private static readonly string[] Wanted = Environment.GetEnvironmentVariable("LOADWATCH_KILL_AT")?.Split(':') ?? [];
    private static readonly int WantedPassing = Wanted.Length > 1 ? int.Parse(Wanted[1], CultureInfo.InvariantCulture) : 1;

    private static int passings;

    public static void Pass(string name)
    {
        if (Wanted.Length > 0 && Wanted[0] == name && Interlocked.Increment(ref passings) == WantedPassing)
        {
            using var self = System.Diagnostics.Process.GetCurrentProcess();
            self.Kill();
            Thread.Sleep(Timeout.Infinite);
        }
    }
}
