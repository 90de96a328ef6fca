namespace LoadWatch.Service.Pipeline;

/// <summary>Named places at which a test may end the process as a power cut would: the variable LOADWATCH_KILL_AT names one. Does nothing otherwise.</summary>
public static class KillPoint
{
    private static readonly string? Wanted = Environment.GetEnvironmentVariable("LOADWATCH_KILL_AT");

    public static void Pass(string name)
    {
        if (Wanted == name)
        {
            using var self = System.Diagnostics.Process.GetCurrentProcess();
            self.Kill();
            Thread.Sleep(Timeout.Infinite);
        }
    }
}
