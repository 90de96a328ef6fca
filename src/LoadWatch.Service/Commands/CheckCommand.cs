using System.CommandLine;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch check</c>: reads the configuration, touches nothing.</summary>
public static class CheckCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var command = new Command("check", "Read the configuration, the roster and the anchors, and say what is wrong with them.") { config };
        command.SetAction(parsed => Check(parsed.GetValue(config)!));
        return command;
    }

    private static int Check(string path)
    {
        var configuration = ConfigurationReader.Read(path);
        Console.Out.WriteLine(
            $"{path} is fine. People: {configuration.People.Count}; groups: {configuration.Groups.Count}; "
            + $"contacts: {configuration.Contacts.Count}; inboxes: {configuration.Inboxes.Count}.");
        foreach (var inbox in configuration.Inboxes.Where(inbox => !Directory.Exists(inbox.Path)))
        {
            Console.Out.WriteLine($"The inbox \"{inbox.Name}\" is not there now: {inbox.Path}");
        }

        return ExitCode.Ok;
    }
}
