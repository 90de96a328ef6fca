using System.CommandLine;
using Spectre.Console;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch rebuild</c>: drop what is derived and compute it again from the archive.</summary>
public static class RebuildCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var command = new Command("rebuild", "Drop everything derived and compute it again from the archive of originals; sends nothing.") { config };
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

        Console.Out.WriteLine($"Rebuilt: {sweep.Report.Settled.Values.Sum()} arrivals, {sweep.Report.PeopleComputed} people.");
        return ExitCode.Ok;
    }
}
