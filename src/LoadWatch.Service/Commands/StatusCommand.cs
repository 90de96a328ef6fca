using System.CommandLine;
using System.Data.Common;
using System.Globalization;
using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Service.Health;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary>
/// <c>loadwatch status</c>: whether the service does its work, for people and, by its exit code, for monitoring programs. It answers whatever is broken.
/// </summary>
public static class StatusCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var json = CommonOptions.Json();
        var maxAge = new Option<int?>("--max-age")
        {
            Description = "Minutes that the last good sweep may be old; the scan interval and ten minutes where it is not given.",
            HelpName = "MINUTES",
        };
        maxAge.Validators.Add(result =>
        {
            if (result.GetValueOrDefault<int?>() is <= 0)
            {
                result.AddError("--max-age must be 1 or more");
            }
        });
        var command = new Command("status", "Say how the service is and what waits for somebody. Exit codes: 0 well, 1 warning, 2 critical, 3 unknown.") { config, json, maxAge };
        command.SetAction(parsed => Run(
            parsed.GetValue(config)!, parsed.GetValue(json), parsed.GetValue(maxAge) is { } minutes ? Duration.FromMinutes(minutes) : null));
        return command;
    }

    private static int Run(string configPath, bool json, Duration? maxAge)
    {
        var troubles = new List<Trouble>();
        var stored = Stored(configPath, troubles);
        var status = DataPlace.Of(configPath) is { } data ? StatusFile.Read(data) : null;
        var verdict = StatusVerdict.Of(status, troubles, MachineClock.Now(), maxAge);
        var summary = new StatusSummary(
            Statuses.Version, verdict.Code, verdict.Word, verdict.Sentence, verdict.Troubles, status, stored?.Arrivals, stored?.DeliveriesWaiting, stored?.Undelivered ?? [], stored?.People);
        Console.Out.WriteLine(json ? Words.Line(summary) : Text(summary));
        return verdict.Code;
    }

    /// <summary>What the database says now; null, and a trouble more, where it cannot be asked.</summary>
    private static StoredSummary? Stored(string configPath, List<Trouble> troubles)
    {
        try
        {
            using var workplace = Workplace.OpenToLook(configPath);
            return workplace.Store.Read(session => Stored(workplace, session));
        }
        catch (ConfigurationException e)
        {
            troubles.Add(new Trouble("configuration", true, $"The configuration is faulty, so a new start would fail: {e.Faults[0]}; loadwatch check names all faults."));
        }
        catch (DatabaseRefusedException e)
        {
            AddRefused(configPath, e.Message, troubles);
        }
        catch (DbException e) when (StoreTroubles.Of(e) == StoreTrouble.Damaged)
        {
            troubles.Add(new Trouble("database", true, OneLine.Sentence(StoreTroubles.AdviceOfDamage)));
        }
        catch (Exception e) when (e is DbException or IOException or UnauthorizedAccessException)
        {
            troubles.Add(new Trouble("database", true, $"The database cannot be read: {e.Message}"));
        }

        return null;
    }

    /// <summary>No database is no trouble before the first sweep.</summary>
    private static void AddRefused(string configPath, string message, List<Trouble> troubles)
    {
        if (DataPlace.Of(configPath) is { } data && (StatusFile.Read(data) is not null || File.Exists(DataFolder.At(data).DatabasePath)))
        {
            troubles.Add(new Trouble("database", true, OneLine.Sentence(message)));
        }
    }

    private static StoredSummary Stored(Workplace workplace, StoreSession session)
    {
        var counts = session.Arrivals.CountByState();
        return new StoredSummary(
            Enum.GetValues<ArrivalState>().ToDictionary(state => Words.Of(state), state => counts.GetValueOrDefault(state), StringComparer.Ordinal),
            session.Notices.Backlog().Count,
            [.. MissedNotices.All(session, workplace.Configuration).Select(missed => $"{MissedNotices.Subject(missed.Channel, missed.Contact)} {MissedNotices.Sentence(missed)}")],
            workplace.Configuration.People.Count);
    }

    private static string Text(StatusSummary summary)
    {
        List<string> lines = [$"{summary.Word}: {OneLine.Of(summary.Sentence)}", $"LoadWatch {summary.Version}"];
        if (summary.Service is { } service)
        {
            lines.Add($"Last sweep that ended well: {service.LastDone ?? "none"}; files that cannot be read: {service.Unreadable}; something new last came in: {service.LastArrival ?? "never"}");
        }

        if (summary.Arrivals is { } arrivals)
        {
            lines.Add($"Arrivals: {string.Join(", ", arrivals.Select(pair => $"{pair.Value} {pair.Key}"))}");
            lines.Add(string.Create(CultureInfo.InvariantCulture, $"People: {summary.People}; deliveries waiting: {summary.DeliveriesWaiting}"));
        }

        lines.AddRange(summary.Troubles.Select(trouble => OneLine.Of($"{(trouble.Critical ? "Critical" : "Warning")}: {trouble.Sentence}")));
        lines.AddRange(summary.Undelivered.Select(OneLine.Of));
        return string.Join(Environment.NewLine, lines);
    }

    private sealed record StoredSummary(IReadOnlyDictionary<string, int> Arrivals, int DeliveriesWaiting, IReadOnlyList<string> Undelivered, int People);

    private sealed record StatusSummary(
        string Version,
        int Code,
        string Word,
        string Sentence,
        IReadOnlyList<Trouble> Troubles,
        ServiceStatus? Service,
        IReadOnlyDictionary<string, int>? Arrivals,
        int? DeliveriesWaiting,
        IReadOnlyList<string> Undelivered,
        int? People);
}
