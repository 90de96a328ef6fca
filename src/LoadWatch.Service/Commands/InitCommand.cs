using System.CommandLine;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch init</c>: a working folder for a new user; on one that is there it adds what is missing and never writes over a file.</summary>
public static class InitCommand
{
    public static Command Create()
    {
        var dir = new Option<string>("--dir", "-d") { Description = "The folder to make.", Required = true, HelpName = "FOLDER" };
        var command = new Command("init", "Write a working folder: configuration, roster, anchors and an inbox. Files that are there stay as they are.") { dir };
        command.SetAction(parsed => Init(parsed.GetValue(dir)!, Console.Out));
        return command;
    }

    /// <returns>An exit code of <see cref="ExitCode"/>.</returns>
    /// <exception cref="ConfigurationException">The folder holds a configuration with faults.</exception>
    public static int Init(string dir, TextWriter output)
    {
        var folder = Path.GetFullPath(dir);
        var made = WorkingFolder.Make(folder);
        foreach (var path in made.Written)
        {
            output.WriteLine($"wrote {path}");
        }

        foreach (var path in made.PersonFolders)
        {
            output.WriteLine($"made {path}");
        }

        output.WriteLine(made switch
        {
            { IsNew: true } => NextSteps(folder),
            { Written.Count: 0, PersonFolders.Count: 0 } => $"{folder} has a configuration and nothing is missing; no file was changed.",
            _ => $"{folder} had a configuration already; no file of it was changed.",
        });
        return ExitCode.Ok;
    }

    private static string NextSteps(string folder) => $"""
        {folder} is ready. Next:
          1. roster.csv   write a line for each person: person,name,group,birth_year,sex,time_zone
          2. anchors.csv  add what you know: at least heart_rate_rest and heart_rate_max; critical_power, w_prime and power_max for cyclists;
                          one_repetition_max by exercise for strength work
          3. {Self.Name} init --dir {folder}   again makes a sub-folder of inbox/ for each person of the roster; so does every sweep
          4. inbox/       drop FIT or CSV files (also in gzip or zip) into the person's sub-folder
          5. {Self.Name} check --config {Path.Combine(folder, StarterFiles.Configuration)}
             {Self.Name} sweep --config {Path.Combine(folder, StarterFiles.Configuration)}
             then open {Path.Combine(folder, "pages", "staff.html")}
          6. {Self.Name} run --config {Path.Combine(folder, StarterFiles.Configuration)}   does it every night by itself
        """;
}
