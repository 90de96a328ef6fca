using System.CommandLine;
using LoadWatch.Alerts;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch shelve</c>: nobody is told of an alert up to a date.</summary>
public static class ShelveCommand
{
    public static Command Create()
    {
        var alert = new Argument<string>("alert") { Description = "Id of an alert, as loadwatch alerts prints it." };
        var until = CommonOptions.Date("--until", $"Last date on which it is not told, at most {AlertReview.LongestShelvingDays} days ahead.");
        until.Required = true;
        var (by, note, config) = (CommonOptions.By(), CommonOptions.Note(), CommonOptions.Config());
        var command = new Command("shelve", "Say that an alert is not to be told up to a date; possible while the service runs.") { alert, until, by, note, config };
        command.SetAction(parsed =>
        {
            using var workplace = Workplace.OpenToDecide(parsed.GetValue(config)!);
            var circumstances = new Circumstances(MachineClock.Now(), parsed.GetValue(by), parsed.GetValue(note));
            return workplace.Settled(Run(workplace, parsed.GetValue(alert)!, parsed.GetValue(until)!.Value, circumstances, Console.Out, Console.Error));
        });
        return command;
    }

    /// <param name="until">Last date, inclusive.</param>
    /// <returns>An exit code of <see cref="ExitCode"/>.</returns>
    public static int Run(Workplace workplace, string alertId, LocalDate until, Circumstances circumstances, TextWriter output, TextWriter errors)
    {
        if (workplace.Store.Read(session => session.Alerts.Get(alertId)) is not { } alert)
        {
            var known = workplace.Store.Read(session => session.Alerts.All()).Select(one => one.Id);
            errors.WriteLine($"\"{alertId}\" is no alert known here{Nearest.Hint(alertId, known)}");
            return ExitCode.Usage;
        }

        var today = DecisionEffects.Today(workplace.Configuration, alert.Key.Person, circumstances.Now);
        var last = today.PlusDays(AlertReview.LongestShelvingDays);
        if (until < today || until > last)
        {
            errors.WriteLine($"--until: {Words.Date(until)} is not a date from {Words.Date(today)} to {Words.Date(last)}");
            return ExitCode.Usage;
        }

        output.WriteLine(Shelve(workplace, alert, today, until, circumstances));
        return ExitCode.Ok;
    }

    private static string Shelve(Workplace workplace, Alert alert, LocalDate today, LocalDate until, Circumstances circumstances)
    {
        var decision = new Decision(DecisionKind.Shelve, alert.Id, alert.Key.Person, circumstances.Now, circumstances.By, circumstances.Note)
        {
            From = today,
            Until = until,
        };
        return (workplace.Store.Write(session => new DecisionEffects(workplace.Configuration, session).Make(decision)), AlertLife.IsActive(alert.State)) switch
        {
            (true, _) => $"Shelved until {Words.Date(until)}: {alert.Text}",
            (_, true) => $"Already shelved until {Words.Date(until)}.",
            _ => $"Nothing to shelve: the alert is {Words.Of(alert.State)}.",
        };
    }
}
