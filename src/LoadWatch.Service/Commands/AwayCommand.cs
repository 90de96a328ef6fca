using System.CommandLine;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch away</c>: somebody does not train as usual, or does again.</summary>
public static class AwayCommand
{
    private static readonly DecisionKind[] Kinds =
        [DecisionKind.Ill, DecisionKind.Injured, DecisionKind.Away, DecisionKind.Returning, DecisionKind.Rest, DecisionKind.Match];

    public static Command Create()
    {
        var person = new Argument<string>("person") { Description = "Id of the person." };
        var from = CommonOptions.Date("--from", "First date; without it today.");
        var until = CommonOptions.Date("--until", "Last date; without it an absence is open, and rest or a match is of one date.");
        var kind = new Option<string>("--as") { Description = "What it is; returning ends an open absence.", DefaultValueFactory = _ => Words.Of(DecisionKind.Away) };
        kind.AcceptOnlyFromAmong([.. Kinds.Select(Words.Of)]);
        var (by, note, config) = (CommonOptions.By(), CommonOptions.Note(), CommonOptions.Config());
        var command = new Command("away", "Say that somebody is ill, injured or away, returns, rests or plays; possible while the service runs.")
        {
            person, from, until, kind, by, note, config,
        };
        command.SetAction(parsed =>
        {
            using var workplace = Workplace.OpenToDecide(parsed.GetValue(config)!);
            if (!PersonArgument.TryResolve(workplace.Configuration, parsed.GetValue(person), out var id))
            {
                return ExitCode.Usage;
            }

            var circumstances = new Circumstances(MachineClock.Now(), parsed.GetValue(by), parsed.GetValue(note));
            var meant = Kinds.First(candidate => Words.Of(candidate) == parsed.GetValue(kind));
            return workplace.Settled(Run(workplace, id!, meant, parsed.GetValue(from), parsed.GetValue(until), circumstances, Console.Out, Console.Error));
        });
        return command;
    }

    /// <param name="person">Id as the roster writes it.</param>
    /// <param name="from">Null: today, by the person's clock.</param>
    /// <param name="until">Last date, inclusive, or null.</param>
    /// <returns>An exit code of <see cref="ExitCode"/>.</returns>
    public static int Run(
        Workplace workplace, string person, DecisionKind kind, LocalDate? from, LocalDate? until, Circumstances circumstances, TextWriter output, TextWriter errors)
    {
        var first = from ?? DecisionEffects.Today(workplace.Configuration, person, circumstances.Now);
        if (Fault(kind, first, until) is { } fault)
        {
            errors.WriteLine(fault);
            return ExitCode.Usage;
        }

        var decision = new Decision(kind, person, person, circumstances.Now, circumstances.By, circumstances.Note) { From = first, Until = until };
        output.WriteLine(workplace.Store.Write(session => Decide(workplace, session, decision)));
        return ExitCode.Ok;
    }

    private static string? Fault(DecisionKind kind, LocalDate from, LocalDate? until) => (kind, until) switch
    {
        (DecisionKind.Returning, not null) => "--until: returning has no last date",
        (_, { } last) when last < from => $"--until: {Words.Date(last)} lies before {Words.Date(from)}",
        _ => null,
    };

    private static string Decide(Workplace workplace, StoreSession session, Decision decision)
    {
        var of = session.Decisions.InForce(decision.Person).Where(earlier => earlier.Subject == decision.Person).ToList();
        if (of.LastOrDefault() is { } last && (last.Kind, last.From, last.Until) == (decision.Kind, decision.From, decision.Until))
        {
            return $"{decision.Person} is already {DecisionText.Sentence(last, of)}";
        }

        var nothingToEnd = decision.Kind == DecisionKind.Returning && !Absences.Decided(of).Any(absence => absence.Covers(decision.From!.Value.PlusDays(-1)));
        new DecisionEffects(workplace.Configuration, session).Make(decision);
        return $"{decision.Person}: {DecisionText.What(decision, of)}; computed by the next sweep.{(nothingToEnd ? " No absence stood until then." : "")}";
    }
}
