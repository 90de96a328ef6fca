using System.CommandLine;
using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Stimulus;
using NodaTime;
using Spectre.Console;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch people</c>: who is watched and where each stands.</summary>
public static class PeopleCommand
{
    public static Command Create()
    {
        var config = CommonOptions.Config();
        var json = CommonOptions.Json();
        var command = new Command("people", "List who is watched, with the last computed day of each.") { config, json };
        command.SetAction(parsed => Run(parsed.GetValue(config)!, parsed.GetValue(json)));
        return command;
    }

    private static int Run(string configPath, bool json)
    {
        using var workplace = Workplace.OpenToRead(configPath);
        var now = MachineClock.Now();
        var lines = workplace.Store.Read(session =>
        {
            var plans = new PersonPlans(workplace.Configuration).Of(session);
            return workplace.Configuration.People.Values
                .OrderBy(person => person.Id, StringComparer.Ordinal)
                .Select(person => Line(person, LastDay.Of(session, person.Id), AbsenceOn(plans[person.Id], PersonDay.On(now, person))))
                .ToList();
        });
        if (json)
        {
            Console.Out.WriteLine(Words.Line(lines));
        }
        else
        {
            Print(lines);
        }

        return ExitCode.Ok;
    }

    /// <summary>The console is the operator's: it shows the true word.</summary>
    private static Absence? AbsenceOn(PersonPlan plan, LocalDate today) => plan.Absences.FirstOrDefault(absence => absence.Covers(today));

    private static PersonLine Line(Person person, Day? last, Absence? absence) => new(
        person.Id,
        person.Name,
        person.Group,
        last is null ? null : Words.Date(last.Date),
        last?.DaysSinceRecorded is { } days ? Words.Date(last.Date.PlusDays(-days)) : null,
        last?.Acute,
        last?.RatioUncoupled,
        last?.Coverage28,
        last is not null && last.Regions.TryGetValue(BodyRegion.Legs, out var legs) ? legs.DaysSince : null,
        absence is null ? null : Words.Of(absence.Word),
        absence is null ? null : Words.Date(absence.From),
        absence?.Until is { } until ? Words.Date(until) : null);

    private static void Print(List<PersonLine> lines)
    {
        var table = new Table().AddColumns("person", "name", "group", "last", "week", "ratio", "known", "legs", "absence");
        foreach (var line in lines)
        {
            table.AddRow(
                Markup.Escape(line.Person),
                Markup.Escape(OneLine.Of(line.Name)),
                Markup.Escape(line.Group),
                line.LastRecorded ?? "none",
                line.WeekLoad is { } load ? FormattableString.Invariant($"{load:0}") : "?",
                line.RatioUncoupled is { } ratio ? FormattableString.Invariant($"{ratio:0.00}") : "?",
                line.Coverage28 is { } coverage ? FormattableString.Invariant($"{100 * coverage:0} %") : "?",
                line.DaysSinceHeavyOrFastLegs is { } days ? FormattableString.Invariant($"{days} {(days == 1 ? "day" : "days")}") : "?",
                line.Absence is { } word ? $"{word} since {line.AbsentSince}{(line.AbsentUntil is { } until ? $" until {until}" : "")}" : "");
        }

        TableOutput.Write(table);
        Console.Out.WriteLine(
            "last: last recording. week: load of 7 days, made whole where some of them are unknown (a brief shows it as it is so far). ratio: against the mean week of "
            + "the 21 days before, made whole likewise. known: share of 28 days with known load. legs: since the last heavy or fast leg work. ?: unknown.");
    }

    private sealed record PersonLine(
        string Person,
        string Name,
        string Group,
        string? ComputedTo,
        string? LastRecorded,
        double? WeekLoad,
        double? RatioUncoupled,
        double? Coverage28,
        int? DaysSinceHeavyOrFastLegs,
        string? Absence,
        string? AbsentSince,
        string? AbsentUntil);
}
