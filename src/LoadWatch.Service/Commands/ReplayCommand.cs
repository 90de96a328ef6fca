using System.CommandLine;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Replays;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch replay</c>: what other limits would have told over the stored past, beside today's. Reads only.</summary>
public static class ReplayCommand
{
    private const int UsualDays = 365;

    public static Command Create()
    {
        var limits = new Argument<string>("file") { Description = "A loadwatch.json, or as much of one as holds limits." };
        var from = CommonOptions.Date("--from", "First date to count; a year before the last by default.");
        var to = CommonOptions.Date("--to", "Last date to count.");
        var marks = new Option<string[]>("--mark") { Description = "A date of a person before which an alert was wanted: ID@2026-03-31; may stand several times.", HelpName = "MARK", DefaultValueFactory = _ => [] };
        var config = CommonOptions.Config();
        var json = CommonOptions.Json();
        var command = new Command("replay", "Count what other limits would have told over the stored past, beside today's.") { limits, from, to, marks, config, json };
        command.SetAction(parsed => Run(
            parsed.GetValue(config)!, parsed.GetValue(limits)!, parsed.GetValue(from), parsed.GetValue(to), parsed.GetValue(marks)!, parsed.GetValue(json)));
        return command;
    }

    private static int Run(string configPath, string file, LocalDate? from, LocalDate? to, string[] words, bool json)
    {
        using var workplace = Workplace.OpenToLook(configPath);
        var configuration = workplace.Configuration;
        var others = OtherLimits.Read(file, configuration.Groups, configuration.People);
        var own = OtherLimits.Read(configPath, configuration.Groups, configuration.People);
        if (!TryRead(words, configuration, out var marks))
        {
            return ExitCode.Usage;
        }

        var past = workplace.Store.Read(session => configuration.People.Values.OrderBy(person => person.Id, StringComparer.Ordinal).Select(person => Past(session, configuration, person)).ToList());
        if (past.Where(person => person.Days.Count > 0).Max(person => (LocalDate?)person.Days[^1].Date) is not { } newest)
        {
            Console.Out.WriteLine("Nothing is stored yet that could be looked at.");
            return ExitCode.Ok;
        }

        var last = to is { } wanted && wanted < newest ? wanted : newest;
        var first = from ?? last.PlusDays(1 - UsualDays);
        if (first > last)
        {
            Console.Error.WriteLine($"--from {Words.Date(first)} lies behind {Words.Date(last)}, the last date");
            return ExitCode.Usage;
        }

        var cut = past.ConvertAll(person => person with { Days = [.. person.Days.TakeWhile(day => day.Date <= last)] });
        var contacts = configuration.Contacts
            .Select(contact => (contact, (IReadOnlySet<string>)configuration.PeopleOf(contact).Select(person => person.Id).ToHashSet(StringComparer.Ordinal)))
            .ToList();
        var told = workplace.Store.Read(session => Told(session, configuration, last));
        ReplayFigures By(Func<ReplayedPerson, RuleLimits> limits) => Figures([.. cut.AsParallel().AsOrdered().Select(person => PersonReplay.Of(person, limits(person)))]);
        ReplayFigures Figures(IReadOnlyList<PersonReplay> people) => ReplayFigures.Of(people, contacts, marks, first, last);
        var comparison = new ReplayComparison(
            first,
            last,
            Figures(told),
            By(person => person.Group.Limits),
            By(person => others.Of(person.Person.Id, configuration.Groups[person.Group.Id], own)));
        Console.Out.Write(json ? comparison.Json() : comparison.Text());
        return ExitCode.Ok;
    }

    /// <summary>Changes are read at once, in the order of their commits.</summary>
    private static IReadOnlyList<PersonReplay> Told(StoreSession session, WorkingConfiguration configuration, LocalDate last)
    {
        var changes = session.Alerts.Changes.Since(0).ToLookup(change => change.AlertId, StringComparer.Ordinal);
        return
        [
            .. configuration.People.Keys.Order(StringComparer.Ordinal).Select(person =>
            {
                var alerts = session.Alerts.All(person);
                return PersonReplay.Stored(person, alerts, [.. alerts.SelectMany(alert => changes[alert.Id]).OrderBy(change => change.Date).ThenBy(change => change.Sequence)], last);
            }),
        ];
    }

    private static ReplayedPerson Past(StoreSession session, WorkingConfiguration configuration, Person person)
    {
        var through = LocalDate.MaxIsoValue;
        var tests = TestRows.Of(session, TableBasis.Of(configuration, session), person, LocalDate.MinIsoValue, through);
        return new ReplayedPerson(
            person,
            configuration.GroupOf(person),
            session.Days.Before(person.Id, through, LocalDate.MinIsoValue),
            new PersonPlans(configuration).Of(session, person, LocalDate.MinIsoValue, through),
            [.. tests.OrderBy(test => test.Date)])
        {
            BestMeans = session.Activities.BestMeans(person.Id, LocalDate.MinIsoValue, through),
        };
    }

    private static bool TryRead(string[] words, WorkingConfiguration configuration, out IReadOnlyList<Mark> marks)
    {
        var read = new List<Mark>();
        marks = read;
        foreach (var word in words)
        {
            var at = word.LastIndexOf('@');
            if (at < 1 || !LocalDatePattern.Iso.Parse(word[(at + 1)..]).TryGetValue(default, out var date))
            {
                Console.Error.WriteLine($"\"{word}\" is no mark such as anna@2026-03-31");
                return false;
            }

            if (!PersonArgument.TryResolve(configuration, word[..at], out var person))
            {
                return false;
            }

            read.Add(new Mark(person!, date));
        }

        return true;
    }
}
