using System.CommandLine;
using LoadWatch.Service.Health;
using LoadWatch.Service.Schedule;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Logging;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch run</c>: the service, until it is told to stop.</summary>
public static class RunCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var command = new Command("run", "Run the service: scan the inboxes, evaluate every night, deliver every morning.") { config };
        command.SetAction((parsed, cancel) => RunAsync(parsed.GetValue(config)!, cancel));
        return command;
    }

    private static async Task<int> RunAsync(string configPath, CancellationToken cancel)
    {
        using var workplace = Workplace.OpenToWork(configPath);
        using var host = ServiceHost.Build(workplace, configPath);
        var log = host.Services.GetRequiredService<ILoggerFactory>().CreateLogger("LoadWatch");
        LogMessages.ServiceStarted(
            log,
            typeof(RunCommand).Assembly.GetName().Version!.ToString(3),
            workplace.Configuration.People.Count,
            workplace.Configuration.Inboxes.Count,
            workplace.Configuration.Contacts.Count,
            DateTimeZoneProviders.Tzdb.VersionId);
        var code = await ServiceRun.ToTheEndAsync(host, cancel);
        return code == ExitCode.Ok ? workplace.Settled(code) : code;
    }
}
