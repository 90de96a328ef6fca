using System.Globalization;
using Serilog;
using Serilog.Events;
using Serilog.Formatting.Compact;

namespace LoadWatch.Service.Health;

/// <summary>Where the service logs to: JSON lines, a file a day, and the terminal or the journal.</summary>
public static class ServiceLog
{
    private const int DaysKept = 31;

    /// <param name="dataFolder">The log lies in its sub-folder <c>log</c>.</param>
    public static void Configure(LoggerConfiguration logger, string dataFolder, bool toConsole)
    {
        logger.MinimumLevel.Information()
            .MinimumLevel.Override("Quartz", LogEventLevel.Warning)
            .MinimumLevel.Override("Microsoft", LogEventLevel.Warning)
            .WriteTo.File(
                new CompactJsonFormatter(),
                Path.Combine(dataFolder, "log", "loadwatch-.jsonl"),
                rollingInterval: RollingInterval.Day,
                retainedFileCountLimit: DaysKept);
        if (toConsole)
        {
            logger.WriteTo.Console(formatProvider: CultureInfo.InvariantCulture, outputTemplate: "{Timestamp:HH:mm:ss} {Level:u3} {Message:lj}{NewLine}{Exception}");
        }
    }
}
