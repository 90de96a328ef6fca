using System.CommandLine;
using System.Globalization;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Demo;
using LoadWatch.Service.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch demo</c>: the main job on invented people.</summary>
public static class DemoCommand
{
    /// <summary>The time of the morning at which the demo looks at its night.</summary>
    private static readonly LocalTime SweptAt = new(7, 30);

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

        var demo = new DemoFolder(folder, seed, until);
        demo.Arrive(demo.Mornings[0]);
        DemoMark.Set(folder);
        var config = Path.Combine(folder, "loadwatch.json");
        if (filesOnly)
        {
            Arrive(demo);
        }
        else
        {
            Sweep(demo, config, cancel);
        }

        Tell(demo.Summary);
        Console.Out.WriteLine();
        Console.Out.WriteLine("Next:");
        foreach (var next in filesOnly ? ["sweep"] : new[] { "people", "alerts", "explain PERSON" })
        {
            Console.Out.WriteLine($"  {Self.Name} {next} --config {config}");
        }

        return ExitCode.Ok;
    }

    private static void Arrive(DemoFolder demo)
    {
        foreach (var morning in demo.Mornings.Skip(1))
        {
            demo.Arrive(morning);
        }
    }

    /// <summary>A sweep on every morning; the last one's brief is shown.</summary>
    private static void Sweep(DemoFolder demo, string config, CancellationToken cancel)
    {
        using var workplace = Workplace.OpenToWork(config);
        SweepReport? report = null;
        foreach (var morning in demo.Mornings)
        {
            if (report is not null)
            {
                demo.Arrive(morning);
            }

            report = workplace.NewSweep(At(morning, workplace)).Run(cancel);
            Console.Out.WriteLine($"{Morning(morning)}: {SweepCommand.Counts(report)}");
        }

        workplace.Store.Settle();
        Console.Out.WriteLine();
        var now = At(demo.Mornings[^1], workplace);
        BriefCommand.Print(workplace, null, new Briefs(workplace.Configuration, now, report!.Unreadable, report.MissingInboxes));
        foreach (var page in report.Pages)
        {
            Console.Out.WriteLine($"Page: {page}");
        }
    }

    private static Instant At(LocalDate morning, Workplace workplace) => morning.At(SweptAt).InZoneLeniently(workplace.Configuration.Contacts[0].Zone).ToInstant();

    private static string Morning(LocalDate date) => date.ToString("d MMMM", CultureInfo.InvariantCulture);

    private static void Tell(DemoSummary summary)
    {
        Console.Out.WriteLine();
        Console.Out.WriteLine($"Demo, all people invented: {summary.People} people, {summary.Files} files in {summary.Folder}. What happens:");
        foreach (var line in summary.Story)
        {
            Console.Out.WriteLine($"- {line}");
        }
    }
}
