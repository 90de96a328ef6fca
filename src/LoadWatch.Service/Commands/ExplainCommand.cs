using System.CommandLine;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Explain;
using LoadWatch.Storage;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch explain</c>: the numbers behind an alert, a person's day, or a file (I-8).</summary>
public static class ExplainCommand
{
    public static Command Create()
    {
        var subject = new Argument<string>("subject")
        {
            Description = "An alert's id, a person's id, a file's path below its inbox, or the first 6 or more hex digits of its SHA-256.",
        };
        var date = CommonOptions.Date("--date", "The day of the person; without it the last computed one.");
        var config = CommonOptions.Config();
        var command = new Command("explain", "Print the numbers behind an alert, a person's day or a file.") { subject, date, config };
        command.SetAction(parsed =>
        {
            using var workplace = Workplace.OpenToRead(parsed.GetValue(config)!);
            return workplace.Store.Read(session => Run(workplace.Configuration, session, parsed.GetValue(subject)!, parsed.GetValue(date)));
        });
        return command;
    }

    private static int Run(WorkingConfiguration configuration, StoreSession session, string subject, NodaTime.LocalDate? date)
    {
        var text = AlertExplanation.Of(session, subject)
            ?? DayExplanation.Of(configuration, session, subject, date)
            ?? FileExplanation.Of(session, subject);
        if (text is null)
        {
            Console.Error.WriteLine($"\"{subject}\" is no alert, person or file known here{Nearest.Hint(subject, configuration.People.Keys)}");
            return ExitCode.Usage;
        }

        Console.Out.WriteLine(text);
        return ExitCode.Ok;
    }
}
