using System.CommandLine;
using LoadWatch.Alerts;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Export;

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
            var alerts = workplace.Configuration.People.Keys.Order(StringComparer.Ordinal)
                .SelectMany(id => session.Alerts.All(id))
                .Where(alert => all || AlertLife.IsActive(alert.State))
                .ToList();
            if (json)
            {
                Exporter.Write(alerts.Select(Exporter.OfAlert), Console.Out);
            }
            else
            {
                Print(workplace.Configuration, alerts);
            }

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

        foreach (var alert in alerts)
        {
            Console.Out.WriteLine(
                $"{OneLine.Of(configuration.People[alert.Key.Person].Name)}: {Words.Of(alert.Severity)}, {Words.Of(alert.State)}{AlertWords.Aside(alert)}, {AlertWords.Since(alert)}");
            Console.Out.WriteLine($"    {OneLine.Of(alert.Text)}");
            Console.Out.WriteLine($"    {alert.Id}");
        }

        Console.Out.WriteLine("loadwatch explain ID prints the numbers behind one.");
    }
}
