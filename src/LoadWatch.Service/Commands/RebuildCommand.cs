using System.CommandLine;
using Spectre.Console;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch rebuild</c>: compute everything derived again from the archive. One that was stopped goes on where it was.</summary>
public static class RebuildCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var command = new Command("rebuild", "Compute everything derived again from the archive of originals; sends nothing. One that was stopped goes on where it was.") { config };
        command.SetAction((parsed, cancel) => Task.FromResult(Run(parsed.GetValue(config)!, cancel)));
        return command;
    }

    private static int Run(string configPath, CancellationToken cancel)
    {
        using var workplace = Workplace.OpenToWork(configPath);
        var sweep = workplace.NewSweep(MachineClock.Now());
        if (Console.IsOutputRedirected)
        {
            sweep.Rebuild(cancel);
        }
        else
        {
            AnsiConsole.Progress().Start(context =>
            {
                var task = context.AddTask("Decoding the archive");
                sweep.Rebuild(cancel, (done, total) => task.Value(total == 0 ? 100 : 100.0 * done / total));
            });
        }

        Console.Out.WriteLine($"Rebuilt: {sweep.Report.Recomputed} arrivals, {sweep.Report.PeopleComputed} people.");
        return workplace.Settled(ExitCode.Ok);
    }
}
