using System.Globalization;
using System.Text;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>A person's day: state, sessions, trends with their coverage, findings.</summary>
public static class DayExplanation
{
    /// <summary>Null where the word is nobody's id.</summary>
    public static string? Of(WorkingConfiguration configuration, StoreSession session, string person, LocalDate? date)
    {
        if (!configuration.People.TryGetValue(person, out var known))
        {
            return null;
        }

        var day = date is { } wanted ? session.Days.OfPerson(known.Id, wanted, wanted).FirstOrDefault() : LastDay.Of(session, known.Id);
        var text = new StringBuilder();
        if (day is null)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"{OneLine.Of(known.Name)}: nothing is computed for {(date is { } missing ? Words.Date(missing) : "any day yet")}.");
            AppendDecisions(text, session, known.Id, date);
            return text.ToString();
        }

        text.AppendLine(CultureInfo.InvariantCulture, $"{OneLine.Of(known.Name)}, {Words.Date(day.Date)}: {Words.Of(day.State)}{(day.StateSource is { } source ? $" ({source})" : "")}");
        AppendDecisions(text, session, known.Id, day.Date);
        var basis = TableBasis.Of(configuration, session);
        foreach (var quiet in NotWatched.Of(session.Days.OfPerson(known.Id, day.Date.PlusDays(-LoadCalendar.LookBackDays), day.Date), configuration.GroupOf(known).Limits))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {quiet.Sentence(day.Date)}");
        }

        var limits = new TodaysLimits(configuration, basis);
        LoadTrendText.Append(text, day, limits.DaysTo(session, known, day.Date), configuration.GroupOf(known));
        DayTrendText.Append(text, day, session.Days.Before(known.Id, day.Date.PlusDays(1), day.Date));
        RoomText.Append(text, limits, session, known, date is null ? [day.Date, day.Date.PlusDays(1)] : [day.Date]);
        ReferenceExplanation.Append(text, known, configuration.GroupOf(known), basis, day.Date);
        ReferenceExplanation.AppendObserved(text, known, basis, day.Date);
        TestText.Append(text, session, basis, known, day.Date);
        var recorded = session.Activities.OfPerson(known.Id, day.Date, day.Date).ToDictionary(activity => activity.Key, StringComparer.Ordinal);
        foreach (var activity in PersonTraining.Of(session, configuration, basis, known, day.Date, day.Date).Activities)
        {
            text.AppendLine();
            SessionText.Append(text, session, activity, recorded.GetValueOrDefault(activity.Key));
        }

        foreach (var finding in session.Findings.OfPerson(known.Id, day.Date, day.Date))
        {
            text.AppendLine();
            FindingExplanation.Append(text, finding);
        }

        return text.ToString();
    }

    /// <summary>What staff said of the date, withdrawn or not: who, when, and why.</summary>
    private static void AppendDecisions(StringBuilder text, StoreSession session, string person, LocalDate? date)
    {
        if (date is not { } day)
        {
            return;
        }

        var decisions = session.Decisions.OfPerson(person);
        var about = decisions.Where(decision => decision.Subject == person && IsAbout(decision, day)).Select(decision => decision.Id).ToHashSet(StringComparer.Ordinal);
        foreach (var decision in decisions.Where(decision => about.Contains(decision.Id) || about.Contains(decision.Subject)))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {DecisionText.Sentence(decision, decisions)}");
        }
    }

    private static bool IsAbout(Decision decision, LocalDate day) => decision.From <= day && decision.Kind switch
    {
        DecisionKind.Ill or DecisionKind.Injured or DecisionKind.Away => !(day > decision.Until),
        _ => day <= (decision.Until ?? decision.From),
    };
}
