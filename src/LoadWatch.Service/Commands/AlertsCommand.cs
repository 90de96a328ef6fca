using System.CommandLine;
using LoadWatch.Alerts;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using Spectre.Console;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch alerts</c>: what stands, and with <c>--all</c> what stood.</summary>
public static class AlertsCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var all = new Option<bool>("--all") { Description = "Also alerts that are over." };
        var json = CommonOptions.Json();
        var command = new Command("alerts", "List alerts.") { config, all, json };
        command.SetAction(parsed => Run(parsed.GetValue(config)!, parsed.GetValue(all), parsed.GetValue(json)));
        return command;
    }

    private static int Run(string configPath, bool all, bool json)
    {
        using var workplace = Workplace.OpenToRead(configPath);
        return workplace.Store.Read(session =>
        {
            if (json)
            {
                new Exporter(workplace.Configuration, session, null, null, null).Write("alerts", Console.Out);
                return ExitCode.Ok;
            }

            var alerts = workplace.Configuration.People.Keys.Order(StringComparer.Ordinal).SelectMany(id => session.Alerts.All(id)).ToList();
            Print(workplace.Configuration, alerts.Where(alert => all || AlertLife.IsActive(alert.State)).ToList());
            return ExitCode.Ok;
        });
    }

    private static void Print(WorkingConfiguration configuration, List<Alert> alerts)
    {
        if (alerts.Count == 0)
        {
            Console.Out.WriteLine("No alert stands.");
            return;
        }

        var table = new Table().AddColumns("person", "severity", "state", "raised", "what", "id");
        foreach (var alert in alerts)
        {
            table.AddRow(
                Markup.Escape(configuration.People[alert.Key.Person].Name),
                Words.Of(alert.Severity),
                Words.Of(alert.State),
                Words.Date(alert.Raised),
                Markup.Escape(alert.Text),
                Markup.Escape(alert.Id));
        }

        TableOutput.Write(table);
        Console.Out.WriteLine("loadwatch explain ID prints the numbers behind one.");
    }
}
