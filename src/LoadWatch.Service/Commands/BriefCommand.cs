using System.CommandLine;
using LoadWatch.Notices;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch brief</c>: a contact's brief as of now, in the terminal.</summary>
public static class BriefCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var contact = new Argument<string?>("contact")
        {
            Description = "Id of a contact; without it every contact's brief.",
            Arity = ArgumentArity.ZeroOrOne,
        };
        var asOf = CommonOptions.Moment("--as-of", "As of this moment instead of now.");
        var command = new Command("brief", "Print the brief of a contact as of now; sends nothing.") { contact, config, asOf };
        command.SetAction(parsed =>
        {
            using var workplace = Workplace.OpenToRead(parsed.GetValue(config)!);
            return Print(workplace, parsed.GetValue(contact), new Briefs(workplace.Configuration, parsed.GetValue(asOf) ?? MachineClock.Now(), [], []));
        });
        return command;
    }

    /// <summary>Prints one contact's brief, or everybody's.</summary>
    public static int Print(Workplace workplace, string? contactId, Briefs briefs)
    {
        var contacts = workplace.Configuration.Contacts
            .Where(contact => contactId is null || string.Equals(contact.Id, contactId, StringComparison.OrdinalIgnoreCase))
            .ToList();
        if (contacts.Count == 0)
        {
            var known = workplace.Configuration.Contacts.Select(contact => contact.Id);
            Console.Error.WriteLine($"\"{contactId}\" is not a contact{Nearest.Hint(contactId!, known)}");
            return ExitCode.Usage;
        }

        foreach (var contact in contacts)
        {
            Console.Out.WriteLine(BriefText.Write(workplace.Store.Read(session => briefs.Build(session, contact))));
        }

        return ExitCode.Ok;
    }
}
