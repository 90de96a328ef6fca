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

        AppendTrends(text, day, configuration.GroupOf(known));
        DayTrendText.Append(text, day, session.Days.Before(known.Id, day.Date.PlusDays(1), day.Date));
        RoomText.Append(text, new TodaysLimits(configuration, basis), session, known, date is null ? [day.Date, day.Date.PlusDays(1)] : [day.Date]);
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

    private static void AppendTrends(StringBuilder text, Day day, Group group)
    {
        Line(text, $"load ({group.LoadQuantity})", day.Load);
        Line(text, "acute: sum of 7 days, scaled to the covered ones", day.Acute);
        Line(text, "chronic: mean week of 28 days, scaled to the covered ones", day.Chronic);
        Line(text, "mean week of days 8 to 28 back", day.ChronicBefore);
        Line(text, "ratio, coupled = acute / chronic", day.RatioCoupled);
        Line(text, "ratio, uncoupled = acute / mean week of days 8 to 28 back", day.RatioUncoupled);
        Line(text, "ratio of exponential averages, 7 and 28 days (Williams 2017)", day.RatioEwma);
        Line(text, "change against the week before, fraction", day.WeeklyChange);
        Line(text, $"monotony = mean / SD ({group.Deviation.Divisor()}) of 7 days (Foster 1998)", day.Monotony);
        Line(text, "strain = week x monotony (Foster 1998)", day.Strain);
        Line(text, "share of 7 days with known load", day.Coverage7);
        Line(text, "share of 28 days with known load", day.Coverage28);
    }

    private static void Line(StringBuilder text, string name, double? value) =>
        text.AppendLine(CultureInfo.InvariantCulture, $"    {name} = {Number(value)}");

    private static string Number(double? value) => value is { } known ? known.ToString("0.###", CultureInfo.InvariantCulture) : "unknown";
}
