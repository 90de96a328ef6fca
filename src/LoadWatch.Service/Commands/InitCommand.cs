using System.CommandLine;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch init</c>: a working folder for a new user.</summary>
public static class InitCommand
{
    public static Command Create()
    {
        var dir = new Option<string>("--dir", "-d") { Description = "The folder to make.", Required = true, HelpName = "FOLDER" };
        var command = new Command("init", "Write a working folder: configuration, roster, anchors and an inbox.") { dir };
        command.SetAction(parsed => Init(parsed.GetValue(dir)!));
        return command;
    }

    private static int Init(string folder)
    {
        folder = Path.GetFullPath(folder);
        foreach (var name in StarterFiles.All.Keys.Where(name => File.Exists(Path.Combine(folder, name))))
        {
            Console.Error.WriteLine($"{Path.Combine(folder, name)} is there already; nothing was written.");
            return ExitCode.CannotCreate;
        }

        Directory.CreateDirectory(Path.Combine(folder, "inbox"));
        foreach (var (name, text) in StarterFiles.All)
        {
            File.WriteAllText(Path.Combine(folder, name), text);
        }

        Console.Out.WriteLine($"""
            {folder} is ready. Next:
              1. roster.csv   write a line for each person: person,name,group,birth_year,sex,time_zone
              2. anchors.csv  add what you know: at least heart_rate_rest and heart_rate_max; critical_power, w_prime and power_max for cyclists;
                              one_repetition_max by exercise for strength work
              3. inbox/       make one sub-folder per person, named as in the roster, and drop FIT or CSV files (also zipped) into it
              4. loadwatch check --config {Path.Combine(folder, "loadwatch.json")}
                 loadwatch sweep --config {Path.Combine(folder, "loadwatch.json")}
                 then open {Path.Combine(folder, "pages", "staff.html")}
              5. loadwatch run --config {Path.Combine(folder, "loadwatch.json")}   does it every night by itself
            """);
        return ExitCode.Ok;
    }
}
