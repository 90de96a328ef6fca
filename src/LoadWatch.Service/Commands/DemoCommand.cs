using System.CommandLine;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Demo;
using LoadWatch.Service.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch demo</c>: the main job on invented people.</summary>
public static class DemoCommand
{
    /// <summary>The morning at which the demo looks at its night.</summary>
    private static readonly LocalTime Morning = new(7, 30);

    public static Command Create()
    {
        var dir = new Option<string?>("--dir", "-d") { Description = "The folder to write, replaced if a demo wrote it; default a temporary one.", HelpName = "FOLDER" };
        var seed = new Option<int>("--seed") { Description = "Varies the numbers, not the story.", DefaultValueFactory = _ => 1, HelpName = "N" };
        var until = CommonOptions.Date("--until", "The morning of the brief; recordings end the day before. Default today.");
        var filesOnly = new Option<bool>("--files-only") { Description = "Stop after writing the files." };
        var command = new Command("demo", "Write an invented squad, class and cyclist with twelve weeks of recordings, take them in and show the morning's brief.")
        {
            dir, seed, until, filesOnly,
        };
        command.SetAction((parsed, cancel) => Task.FromResult(Run(
            parsed.GetValue(dir) ?? Path.Combine(Path.GetTempPath(), "loadwatch-demo"),
            parsed.GetValue(seed),
            parsed.GetValue(until) ?? MachineClock.Now().InZone(MachineZone.Get()).Date,
            parsed.GetValue(filesOnly),
            cancel)));
        return command;
    }

    private static int Run(string folder, int seed, LocalDate until, bool filesOnly, CancellationToken cancel)
    {
        folder = Path.GetFullPath(folder);
        if (!DemoMark.Clear(folder))
        {
            Console.Error.WriteLine($"{folder} holds something that is not a demo; name another folder.");
            return ExitCode.CannotCreate;
        }

        var summary = DemoFolder.Write(folder, seed, until);
        DemoMark.Set(folder);
        Console.Out.WriteLine($"Demo, all people invented: {summary.People} people, {summary.Files} files in {folder}");
        var config = Path.Combine(folder, "loadwatch.json");
        if (!filesOnly)
        {
            Sweep(config, until, cancel);
        }

        Console.Out.WriteLine();
        Console.Out.WriteLine("Next:");
        foreach (var next in filesOnly ? ["sweep"] : new[] { "people", "alerts", "explain PERSON" })
        {
            Console.Out.WriteLine($"  {Self.Name} {next} --config {config}");
        }

        return ExitCode.Ok;
    }

    private static void Sweep(string config, LocalDate until, CancellationToken cancel)
    {
        using var workplace = Workplace.OpenToWork(config);
        var now = until.At(Morning).InZoneLeniently(workplace.Configuration.Contacts[0].Zone).ToInstant();
        var report = workplace.NewSweep(now).Run(cancel);
        Console.Out.WriteLine(SweepCommand.Counts(report));
        Console.Out.WriteLine();
        BriefCommand.Print(workplace, null, new Briefs(workplace.Configuration, now, report.Unreadable, report.MissingInboxes));
        foreach (var page in report.Pages)
        {
            Console.Out.WriteLine($"Page: {page}");
        }
    }
}
