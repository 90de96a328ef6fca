using System.CommandLine;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Explain;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch explain</c>: the numbers behind an alert, a person's day, a session, a finding, a reference value, or a file (I-8).</summary>
public static class ExplainCommand
{
    public static Command Create()
    {
        var subject = new Argument<string>("subject")
        {
            Description = "An alert's id, a person's id, a session's id, a file's path below its inbox, or the first 6 or more hex digits of its SHA-256.",
        };
        var date = CommonOptions.Date("--date", "The day of the person; without it the last computed one.");
        var time = CommonOptions.TimeOfDay("--time", "Of the person's day the session that runs at this time of its clock, whole.");
        var rule = new Option<string?>("--rule") { Description = "Of the person's day what this rule found, and by which limits.", HelpName = "RULE" };
        var anchor = new Option<string?>("--anchor") { Description = "The person's reference value of this kind: heart_rate_max, critical_power and so on.", HelpName = "KIND" };
        var config = CommonOptions.Config();
        var command = new Command("explain", "Print the numbers behind an alert, a person's day, a session, a finding, a reference value or a file.") { subject, date, time, rule, anchor, config };
        command.Validators.Add(result =>
        {
            if (new[] { result.GetResult(time), result.GetResult(rule), result.GetResult(anchor) }.Count(option => option is { Implicit: false }) > 1)
            {
                result.AddError("--time, --rule and --anchor ask for different things: give one of them");
            }
        });
        command.SetAction(parsed =>
        {
            var asked = new Asked(parsed.GetValue(subject)!, parsed.GetValue(date), parsed.GetValue(time), parsed.GetValue(rule), parsed.GetValue(anchor));
            using var workplace = Workplace.OpenToRead(parsed.GetValue(config)!);
            return workplace.Store.Read(session => Run(workplace.Configuration, new Archive(workplace.Folder), session, asked));
        });
        return command;
    }

    private static int Run(WorkingConfiguration configuration, Archive archive, StoreSession session, Asked asked)
    {
        if (asked.IsOfPerson && !configuration.People.ContainsKey(asked.Subject))
        {
            return Refuse($"\"{asked.Subject}\" is not in the roster{Nearest.Hint(asked.Subject, configuration.People.Keys)}");
        }

        if (asked.Anchor is { } kind && AnchorExplanation.Kind(kind) is null)
        {
            return Refuse($"\"{kind}\" is no kind of reference value{Nearest.Hint(kind, AnchorKinds.All.Select(one => one.Name))}");
        }

        if (asked.Rule is { } rule && !RuleBook.All.Any(one => one.Name == rule))
        {
            return Refuse($"\"{rule}\" is no rule{Nearest.Hint(rule, RuleBook.All.Select(one => one.Name))}");
        }

        if (Text(configuration, archive, session, asked) is { } text)
        {
            Console.Out.WriteLine(text);
            return ExitCode.Ok;
        }

        return Refuse(asked is { Time: { } time, Subject: var person }
            ? FormattableString.Invariant($"{person} has no session that runs at {time:HH:mm}; explain {person} lists those of a day")
            : $"\"{asked.Subject}\" is no alert, person, session or file known here{Nearest.Hint(asked.Subject, configuration.People.Keys)}");
    }

    private static string? Text(WorkingConfiguration configuration, Archive archive, StoreSession session, Asked asked) => asked switch
    {
        { Anchor: { } kind } => AnchorExplanation.Of(configuration, session, asked.Subject, kind, asked.Date),
        { Rule: { } rule } => FindingExplanation.Of(configuration, session, asked.Subject, rule, asked.Date),
        { Time: { } time } => SessionExplanation.Of(configuration, archive, session, asked.Subject, asked.Date, time),
        _ => AlertExplanation.Of(session, asked.Subject)
            ?? DayExplanation.Of(configuration, session, asked.Subject, asked.Date)
            ?? SessionExplanation.Of(configuration, archive, session, asked.Subject)
            ?? FileExplanation.Of(session, asked.Subject),
    };

    private static int Refuse(string reason)
    {
        Console.Error.WriteLine(reason);
        return ExitCode.Usage;
    }

    private sealed record Asked(string Subject, LocalDate? Date, LocalTime? Time, string? Rule, string? Anchor)
    {
        /// <summary>True where the subject can only be a person.</summary>
        public bool IsOfPerson => Time is not null || Rule is not null || Anchor is not null;
    }
}
