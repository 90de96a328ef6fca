using System.CommandLine;
using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Export;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch assign</c>: somebody knows whose a file is.</summary>
public static class AssignCommand
{
    private const int MostNamed = 10;

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
            return Run(workplace.Store, parsed.GetValue(file)!, id!, circumstances, Console.Out, Console.Error);
        });
        return command;
    }

    /// <param name="person">Id as the roster writes it.</param>
    /// <returns>An exit code of <see cref="ExitCode"/>.</returns>
    public static int Run(Store store, string file, string person, Circumstances circumstances, TextWriter output, TextWriter errors)
    {
        var (said, fault) = store.Write(session => Refusal(session, file, out var arrival) is { } refusal
            ? (null, refusal)
            : (Assign(session, arrival!, person, circumstances), (string?)null));
        (fault is null ? output : errors).WriteLine(said ?? fault);
        return fault is null ? ExitCode.Ok : ExitCode.Usage;
    }

    /// <summary>Why nothing can be assigned by this word, or null with the one arrival that is meant.</summary>
    private static string? Refusal(StoreSession session, string word, out Arrival? meant)
    {
        var found = MeantArrivals.Of(session, word);
        meant = found is [var only] ? only : null;
        return found switch
        {
            [] => $"\"{word}\" is no file known here",
            [{ Kind: "gzip" or "zip" } archive] => $"{Name(session, archive)} is an archive; assign the files in it: {Members(session, archive)}",
            [{ State: ArrivalState.Aside or ArrivalState.Refused } useless] =>
                $"{Name(session, useless)} has nothing to assign; it is {Words.Of(useless.State)}: {OneLine.Of(useless.Reason ?? "")}",
            [_] => null,
            _ => $"\"{word}\" is more than one file; name one by its digits: {Names(session, found)}",
        };
    }

    private static string Assign(StoreSession session, Arrival arrival, string person, Circumstances circumstances)
    {
        var name = Name(session, arrival);
        if (session.Decisions.OfArrival(arrival.Sha) is [.., var last] && last.Person == person)
        {
            return $"{name} is already assigned to {person}{DecisionText.Circumstances(last)}";
        }

        session.Decisions.Add(new Decision(DecisionKind.Assign, arrival.Sha, person, circumstances.Now, circumstances.By, circumstances.Note));
        session.Audits.Add("assigned", $"{arrival.Sha[..12]} to {person}", circumstances.Now);
        var held = arrival.State == ArrivalState.Held ? $" Until then it is held: {OneLine.Of(arrival.Reason ?? "")}." : "";
        return $"{name} is assigned to {person}; taken up by the next sweep.{held}";
    }

    private static string Members(StoreSession session, Arrival archive) =>
        Names(session, session.Arrivals.All().Where(arrival => arrival.ParentSha == archive.Sha && arrival.Kind is not ("gzip" or "zip")).ToList());

    private static string Names(StoreSession session, IReadOnlyList<Arrival> arrivals)
    {
        var more = arrivals.Count > MostNamed ? $" and {arrivals.Count - MostNamed} more" : "";
        return string.Join(", ", arrivals.Take(MostNamed).Select(arrival => Name(session, arrival))) + more;
    }

    private static string Name(StoreSession session, Arrival arrival) =>
        session.Sightings.Of(arrival.Sha) is [var first, ..] ? $"{arrival.Sha[..12]} ({OneLine.Of(first.Path)})" : arrival.Sha[..12];
}
