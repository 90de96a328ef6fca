using System.CommandLine;
using LoadWatch.Alerts;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch ack</c>: somebody has seen an alert.</summary>
public static class AckCommand
{
    public static Command Create()
    {
        var alert = new Argument<string>("alert") { Description = "Id of an alert, as loadwatch alerts prints it." };
        var (by, note, config) = (CommonOptions.By(), CommonOptions.Note(), CommonOptions.Config());
        var command = new Command("ack", "Say that an alert was seen; possible while the service runs.") { alert, by, note, config };
        command.SetAction(parsed =>
        {
            using var workplace = Workplace.OpenToDecide(parsed.GetValue(config)!);
            var circumstances = new Circumstances(MachineClock.Now(), parsed.GetValue(by), parsed.GetValue(note));
            return workplace.Settled(Run(workplace, parsed.GetValue(alert)!, circumstances, Console.Out, Console.Error));
        });
        return command;
    }

    /// <returns>An exit code of <see cref="ExitCode"/>.</returns>
    public static int Run(Workplace workplace, string alertId, Circumstances circumstances, TextWriter output, TextWriter errors)
    {
        if (workplace.Store.Write(session => Acknowledge(workplace.Configuration, session, alertId, circumstances)) is { } said)
        {
            output.WriteLine(said);
            return ExitCode.Ok;
        }

        var known = workplace.Store.Read(session => session.Alerts.All()).Select(alert => alert.Id);
        errors.WriteLine($"\"{alertId}\" is no alert known here{Nearest.Hint(alertId, known)}");
        return ExitCode.Usage;
    }

    /// <returns>What to say, or null where there is no such alert.</returns>
    private static string? Acknowledge(WorkingConfiguration configuration, StoreSession session, string alertId, Circumstances circumstances)
    {
        if (session.Alerts.Get(alertId) is not { } alert)
        {
            return null;
        }

        var decision = new Decision(DecisionKind.Acknowledge, alertId, alert.Key.Person, circumstances.Now, circumstances.By, circumstances.Note);
        if (!new DecisionEffects(configuration, session).Make(decision))
        {
            return AlreadySaid(alert, DecisionTable.InForce(session.Decisions.OfAlert(alertId)));
        }

        return $"Acknowledged: {OneLine.Of(alert.Text)}";
    }

    private static string AlreadySaid(Alert alert, IReadOnlyList<Decision> decisions) =>
        (alert.State, decisions.LastOrDefault(decision => decision.Kind == DecisionKind.Acknowledge)) switch
        {
            (AlertState.Acknowledged, { } last) => $"Already acknowledged{DecisionText.Circumstances(last)}",
            _ => $"Nothing to acknowledge: the alert is {Words.Of(alert.State)}.",
        };
}
