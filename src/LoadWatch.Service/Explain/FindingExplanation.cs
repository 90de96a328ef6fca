using System.Globalization;
using System.Text;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>What a rule found of a person on a date with its evidence; where it found nothing, whether it looked.</summary>
public static class FindingExplanation
{
    /// <summary>Null where the person is unknown.</summary>
    /// <param name="rule">A name of the rule book.</param>
    /// <param name="date">Null: the last computed day.</param>
    public static string? Of(WorkingConfiguration configuration, StoreSession session, string person, string rule, LocalDate? date)
    {
        if (!configuration.People.TryGetValue(person, out var known))
        {
            return null;
        }

        var text = new StringBuilder();
        if ((date ?? LastDay.Of(session, known.Id)?.Date) is not { } on || session.Days.OfPerson(known.Id, on, on).Count == 0)
        {
            return $"{OneLine.Of(known.Name)}: nothing is computed for {(date is { } missing ? Words.Date(missing) : "any day yet")}.{Environment.NewLine}";
        }

        var found = session.Findings.OfPerson(known.Id, on, on).Where(finding => finding.Rule == rule).ToList();
        text.AppendLine(CultureInfo.InvariantCulture, $"{OneLine.Of(known.Name)}, {Words.Date(on)}, rule {rule}: {found.Count switch { 0 => "no finding", 1 => "1 finding", var more => $"{more} findings" }}");
        foreach (var finding in found)
        {
            Append(text, finding);
        }

        if (found.Count == 0)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {WhyNone(configuration, session, known, rule, on)}");
        }

        if (RuleBook.OfLoad.Any(one => one.Name == rule))
        {
            ReferenceExplanation.Append(text, known, configuration.GroupOf(known), TableBasis.Of(configuration, session), on);
        }

        if (rule == FallingCapacityRule.Word)
        {
            CriticalText.Append(text, configuration, session, known, on);
        }

        text.AppendLine(CultureInfo.InvariantCulture, $"    limits and basis: loadwatch rules {known.Id}");
        return text.ToString();
    }

    /// <summary>As a day shows it, too.</summary>
    public static void Append(StringBuilder text, Finding finding)
    {
        text.AppendLine(CultureInfo.InvariantCulture, $"finding {finding.Rule} ({Words.Of(finding.Severity)}): {OneLine.Of(finding.Text)}");
        AlertExplanation.Append(text, finding.Evidence);
    }

    private static string WhyNone(WorkingConfiguration configuration, StoreSession session, People.Person person, string rule, LocalDate on)
    {
        var limits = configuration.GroupOf(person).Limits;
        if (!RuleBook.All.First(one => one.Name == rule).LimitsOf(limits).Enabled)
        {
            return "the limits in force turn it off";
        }

        var quiet = NotWatched.Of(session.Days.OfPerson(person.Id, on.PlusDays(-LoadCalendar.LookBackDays), on), limits).FirstOrDefault(one => one.Rules.Contains(rule));
        return quiet?.Sentence(on) ?? "no limit passed, or too little is known for it: the day's coverage says so (explain without --rule)";
    }
}
