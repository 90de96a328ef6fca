using System.CommandLine;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch assign</c>: somebody knows whose a file is.</summary>
public static class AssignCommand
{
    public static Command Create()
    {
        var file = new Argument<string>("file") { Description = "A file's path below its inbox, or the first 6 or more hex digits of its SHA-256." };
        var person = new Argument<string>("person") { Description = "Id of the person to whom it belongs." };
        var (by, note, config) = (CommonOptions.By(), CommonOptions.Note(), CommonOptions.Config());
        var command = new Command("assign", "Say whose a file is, whatever folder it lies in; possible while the service runs.") { file, person, by, note, config };
        command.SetAction(parsed =>
        {
            using var workplace = Workplace.OpenToDecide(parsed.GetValue(config)!);
            if (!PersonArgument.TryResolve(workplace.Configuration, parsed.GetValue(person), out var id))
            {
                return ExitCode.Usage;
            }

            var circumstances = new Circumstances(MachineClock.Now(), parsed.GetValue(by), parsed.GetValue(note));
            return workplace.Settled(Run(workplace, parsed.GetValue(file)!, id!, circumstances, Console.Out, Console.Error));
        });
        return command;
    }

    /// <param name="person">Id as the roster writes it.</param>
    /// <returns>An exit code of <see cref="ExitCode"/>.</returns>
    public static int Run(Workplace workplace, string file, string person, Circumstances circumstances, TextWriter output, TextWriter errors)
    {
        var (said, fault) = workplace.Store.Write(session => MeantFile.Refusal(session, file, out var arrival) is { } refusal
            ? (null, refusal)
            : (Assign(new DecisionEffects(workplace.Configuration, session), session, arrival!, person, circumstances), (string?)null));
        (fault is null ? output : errors).WriteLine(said ?? fault);
        return fault is null ? ExitCode.Ok : ExitCode.Usage;
    }

    private static string Assign(DecisionEffects effects, StoreSession session, Arrival arrival, string person, Circumstances circumstances)
    {
        var name = MeantFile.Name(session, arrival);
        if (session.Decisions.Assigned().GetValueOrDefault(arrival.Sha) is { } last && last.Person == person)
        {
            return $"{name} is already assigned to {person}{DecisionText.Circumstances(last)}";
        }

        effects.Make(new Decision(DecisionKind.Assign, arrival.Sha, person, circumstances.Now, circumstances.By, circumstances.Note));
        var held = arrival.State == ArrivalState.Held ? $" Until then it is held: {OneLine.Of(arrival.Reason ?? "")}." : "";
        return $"{name} is assigned to {person}; taken up by the next sweep.{held}";
    }
}
