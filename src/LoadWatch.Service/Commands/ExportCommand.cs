using System.CommandLine;
using System.Text;
using LoadWatch.Service.Export;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch export</c>: what is stored, as JSON Lines.</summary>
public static class ExportCommand
{
    public static Command Create()
    {
        var table = new Argument<string>("what") { Description = "What to write." };
        table.AcceptOnlyFromAmong([.. Exporter.Tables]);
        var person = new Option<string?>("--person") { Description = "Only this person.", HelpName = "ID" };
        var from = CommonOptions.Date("--from", "Only from this date on.");
        var to = CommonOptions.Date("--to", "Only up to this date.");
        var config = CommonOptions.Config();
        var command = new Command("export", "Write what is stored as JSON Lines on standard output.") { table, person, from, to, config };
        command.SetAction(parsed => Run(
            parsed.GetValue(config)!, parsed.GetValue(table)!, parsed.GetValue(person), parsed.GetValue(from), parsed.GetValue(to)));
        return command;
    }

    private static int Run(string configPath, string table, string? personWord, LocalDate? from, LocalDate? to)
    {
        using var workplace = Workplace.OpenToRead(configPath);
        if (!PersonArgument.TryResolve(workplace.Configuration, personWord, out var person))
        {
            return ExitCode.Usage;
        }

        using var output = new StreamWriter(Console.OpenStandardOutput(), new UTF8Encoding(false), 1 << 16);
        return workplace.Store.Read(session =>
        {
            new Exporter(workplace.Configuration, session, person, from, to).Write(table, output);
            return ExitCode.Ok;
        });
    }
}
