using System.CommandLine;
using System.Globalization;
using LoadWatch.Service.Export;
using LoadWatch.Service.Verifications;
using Spectre.Console;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch verify</c>: whether everything kept is still what was written.</summary>
public static class VerifyCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var deep = new Option<bool>("--deep") { Description = "Compute everything anew from the originals besides, in a copy aside, and compare." };
        var json = CommonOptions.Json();
        var command = new Command("verify", "Read the archive and the database to their ends and name what rotted; possible while the service runs.") { config, deep, json };
        command.SetAction((parsed, cancel) => Task.FromResult(Run(parsed.GetValue(config)!, parsed.GetValue(deep), parsed.GetValue(json), cancel)));
        return command;
    }

    private static int Run(string configPath, bool deep, bool json, CancellationToken cancel)
    {
        using var workplace = Workplace.OpenToLook(configPath);
        var report = WithProgress(progress => Verify(workplace, deep, progress, cancel));
        Console.Out.WriteLine(json ? Words.Line(report) : Text(report));
        return report.Found.Count == 0 ? ExitCode.Ok : ExitCode.Data;
    }

    private static VerificationReport Verify(Workplace workplace, bool deep, Action<string, int, int> progress, CancellationToken cancel)
    {
        var report = new Verification(workplace.Folder, workplace.Store, progress).Run(cancel);

        // On rotten ground everything would differ.
        if (!deep || report.Found.Count > 0)
        {
            return report;
        }

        if (new DeepVerification(workplace, progress).Run(cancel) is { } differences)
        {
            return report with { Found = differences };
        }

        Console.Error.WriteLine("Not computed anew: the configuration or the program is another one than at the last sweep; let a sweep run first.");
        return report;
    }

    private static VerificationReport WithProgress(Func<Action<string, int, int>, VerificationReport> work)
    {
        if (Console.IsOutputRedirected)
        {
            return work((_, _, _) => { });
        }

        VerificationReport? report = null;
        AnsiConsole.Progress().Start(context =>
        {
            var tasks = new Dictionary<string, ProgressTask>(StringComparer.Ordinal);
            report = work((what, done, total) =>
            {
                if (!tasks.TryGetValue(what, out var task))
                {
                    task = tasks[what] = context.AddTask($"Reading {what}");
                }

                task.Value(total == 0 ? 100 : 100.0 * done / total);
            });
        });
        return report!;
    }

    private static string Text(VerificationReport report)
    {
        List<string> lines = [.. report.Found.Select(rot => $"{rot.Sentence}. What to do: {rot.Advice}.")];
        lines.Add(string.Create(
            CultureInfo.InvariantCulture,
            $"{report.Originals} originals and {report.Activities} activities read: {(report.Found.Count == 0 ? "all as they were written" : $"{report.Found.Count} rotted")}."));
        if (report.WithoutChecksum > 0)
        {
            lines.Add(string.Create(CultureInfo.InvariantCulture, $"{report.WithoutChecksum} activities are of before checksums were kept: loadwatch rebuild writes them."));
        }

        return string.Join(Environment.NewLine, lines);
    }
}
