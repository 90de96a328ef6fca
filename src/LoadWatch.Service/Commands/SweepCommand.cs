using System.CommandLine;
using LoadWatch.Recordings;
using LoadWatch.Service.Export;
using LoadWatch.Service.Health;
using LoadWatch.Service.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch sweep</c>: take in, evaluate, deliver what is due, exit.</summary>
public static class SweepCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var asOf = CommonOptions.Moment("--as-of", "Judge as of this moment instead of now, for rehearsals: no mail goes out.");
        var command = new Command("sweep", "Take in what is in the inboxes, evaluate, deliver what is due, and exit.") { config, asOf };
        command.SetAction((parsed, cancel) => Task.FromResult(Run(parsed.GetValue(config)!, parsed.GetValue(asOf) ?? MachineClock.Now(), parsed.GetValue(asOf) is not null, cancel)));
        return command;
    }

    private static int Run(string configPath, Instant now, bool isRehearsal, CancellationToken cancel)
    {
        using var workplace = Workplace.OpenToWork(configPath);
        if (isRehearsal)
        {
            workplace.Adopt(workplace.Configuration with { Mail = null });
        }

        var state = new ServiceRecord(started: null);
        state.Began(MachineClock.Now());
        var report = workplace.NewSweep(now).Run(cancel);
        state.Ended(MachineClock.Now(), report, fault: null);
        var status = new Statuses(workplace, state).Write(MachineClock.Now());
        if (!isRehearsal)
        {
            // Somebody is here who reads the clock: what it says from now on counts.
            new ClockGuard(workplace.Store).Note(now);
            new ServiceNotices(workplace.Configuration, now).Tell(workplace.Store, status, report);
        }

        Print(report);
        return workplace.Settled(ExitCode.Ok);
    }

    public static void Print(SweepReport report)
    {
        Console.Out.WriteLine(Counts(report));
        foreach (var line in report.Looks.Where(look => look.Away is not null).Select(look => $"The inbox \"{look.Inbox.Name}\" is not available: {look.Away}.")
            .Concat(report.Unreadable.Select(line => $"Left alone: {line.Subject}: {line.Sentence}"))
            .Concat(report.Undelivered.Select(line => $"Not delivered yet: {line}"))
            .Concat(report.GivenUp.Select(line => $"Not delivered, given up: {line}")))
        {
            Console.Error.WriteLine(OneLine.Of(line));
        }

        foreach (var page in report.Pages)
        {
            Console.Out.WriteLine($"Page: {page}");
        }
    }

    /// <summary>One line that counts each state, with what this sweep added; members of archives are arrivals of their own.</summary>
    public static string Counts(SweepReport report)
    {
        var states = Enum.GetValues<ArrivalState>()
            .Select(state => $"{report.InAll.GetValueOrDefault(state)} {Words.Of(state)}{(report.CountOf(state) is > 0 and var added ? $" (+{added})" : "")}");
        return $"{report.Seen} files in the inboxes, {report.Settling} still settling. Arrivals in all: {string.Join(", ", states)}. "
            + $"{report.AlertChanges} alert changes, {report.NoticesDecided} briefs decided.";
    }
}
