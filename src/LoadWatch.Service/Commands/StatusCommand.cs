using System.CommandLine;
using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Export;
using LoadWatch.Service.Health;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch status</c>: whether the service does its work.</summary>
public static class StatusCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var json = CommonOptions.Json();
        var command = new Command("status", "Say when the last sweep was and what waits for somebody.") { config, json };
        command.SetAction(parsed => Run(parsed.GetValue(config)!, parsed.GetValue(json)));
        return command;
    }

    private static int Run(string configPath, bool json)
    {
        using var workplace = Workplace.OpenToRead(configPath);
        var summary = workplace.Store.Read(session => Summary(workplace, session));
        Console.Out.WriteLine(json ? Words.Line(summary) : Text(summary));
        return ExitCode.Ok;
    }

    private static StatusSummary Summary(Workplace workplace, StoreSession session)
    {
        var counts = session.Arrivals.CountByState();
        return new StatusSummary(
            typeof(StatusCommand).Assembly.GetName().Version!.ToString(3),
            StatusFile.Read(workplace.Folder.Root),
            Enum.GetValues<ArrivalState>().ToDictionary(state => Words.Of(state), state => counts.GetValueOrDefault(state), StringComparer.Ordinal),
            session.Notices.PendingDeliveries().Count,
            [.. session.Notices.MissedDeliveries().Select(missed => $"{MissedNotices.Subject(missed.Channel, missed.Contact)} {MissedNotices.Sentence(missed)}")],
            workplace.Configuration.People.Count);
    }

    private static string Text(StatusSummary summary)
    {
        var arrivals = string.Join(", ", summary.Arrivals.Select(pair => $"{pair.Value} {pair.Key}"));
        var sweep = summary.Service is { } service
            ? $"Last sweep: {service.LastSweep}{(service.Done ? "" : $", failed: {service.Failure}")}; files that cannot be read: {service.Unreadable}"
            : "No sweep yet (loadwatch sweep, or loadwatch run).";
        var faults = summary.Service is { } known
            ? (known.ConfigurationFault?.Split('\n') ?? []).Concat(known.MissingInboxes.Select(name => $"The inbox \"{name}\" cannot be listed."))
            : [];
        return string.Join(
            Environment.NewLine,
            [$"LoadWatch {summary.Version}", sweep, $"Arrivals: {arrivals}", $"People: {summary.People}; deliveries waiting: {summary.DeliveriesWaiting}", .. faults.Select(OneLine.Of), .. summary.Undelivered.Select(OneLine.Of)]);
    }

    private sealed record StatusSummary(
        string Version, StatusLine? Service, IReadOnlyDictionary<string, int> Arrivals, int DeliveriesWaiting, IReadOnlyList<string> Undelivered, int People);
}
