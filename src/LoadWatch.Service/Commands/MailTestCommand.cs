using System.CommandLine;
using LoadWatch.Delivery;
using LoadWatch.Delivery.Mail;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch mail-test</c>: one short message to a contact, and what the server answered.</summary>
public static class MailTestCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var contact = new Argument<string>("contact") { Description = "Id of a contact with a mail address." };
        var command = new Command("mail-test", "Send a short test message to a contact and say what the mail server answered.") { contact, config };
        command.SetAction(parsed => Run(ConfigurationReader.Read(parsed.GetValue(config)!), parsed.GetValue(contact)!, MachineClock.Now(), Console.Out, Console.Error));
        return command;
    }

    /// <returns>An exit code of <see cref="ExitCode"/>.</returns>
    public static int Run(WorkingConfiguration configuration, string contactId, Instant now, TextWriter output, TextWriter errors)
    {
        var contact = configuration.Contacts.FirstOrDefault(contact => string.Equals(contact.Id, contactId, StringComparison.OrdinalIgnoreCase));
        if (contact is null)
        {
            errors.WriteLine($"\"{contactId}\" is not a contact{Nearest.Hint(contactId, configuration.Contacts.Select(known => known.Id))}");
            return ExitCode.Usage;
        }

        if (configuration.Mail is not { } settings || contact.Mail is not { } address)
        {
            errors.WriteLine($"loadwatch.json names no {(configuration.Mail is null ? "mail server" : $"mail address for {contact.Id}")}");
            return ExitCode.Configuration;
        }

        output.WriteLine($"Sending to {contact.Id} by {settings.Host}, port {settings.Port}, {SecurityInWords(settings.Security)}");
        var report = new MailChannel(settings).Send(Test(contact, now), address);
        var sent = report.Outcome.Result == ChannelResult.Delivered;
        (sent ? output : errors).WriteLine(InWords(report));
        return sent ? ExitCode.Ok : ExitCode.Unavailable;
    }

    private static Notice Test(Contact contact, Instant now)
    {
        var date = now.InZone(contact.Zone).Date;
        const string text = "This is a test message of LoadWatch. The morning brief will come by the same way.";
        return new Notice(
            $"{contact.Id}|test-{now.ToUnixTimeMilliseconds()}|{date:uuuu-MM-dd}",
            contact.Id,
            date,
            "Test of the morning brief",
            text + "\n",
            $"<!DOCTYPE html><html lang=\"en\"><title>Test</title><p>{text}</p></html>\n",
            NoticeReason.BriefDue)
        {
            Decided = now,
        };
    }

    private static string SecurityInWords(MailSecurity security) => security switch
    {
        MailSecurity.Starttls => "TLS by STARTTLS",
        MailSecurity.Tls => "TLS",
        _ => "in clear text on this machine",
    };

    private static string InWords(MailReport report) => report switch
    {
        { Outcome.Result: ChannelResult.Delivered, Answer: "" } => "The server took the message.",
        { Outcome.Result: ChannelResult.Delivered } => $"The server took the message and answered: {report.Answer}",
        _ => $"Not sent, {Where(report.Stage)}: {report.Outcome.Reason}",
    };

    private static string Where(MailStage stage) => stage switch
    {
        MailStage.Before => "before the server was reached",
        MailStage.Connecting => "while connecting",
        MailStage.LoggingIn => "while logging in",
        _ => "while handing the message over",
    };
}
