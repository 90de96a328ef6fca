using System.Globalization;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>What is to be minded of somebody in few words, for lists on paper.</summary>
internal static class PersonNotes
{
    /// <summary>The finding as it stands on the last date: <c>no heavy or fast leg work for 22 days, since 6 February</c>.</summary>
    public static string Of(AlertNews news, BriefSubject subject, LocalDate upTo) => news.Alert.Key switch
    {
        { Rule: "silence" } => LastRecorded(subject) is { } last ? $"no recording since {Long(last)}, {Days(last, upTo)}" : "no recording yet",
        { Rule: "stimulus_gap", Region: { } region } => Gap(subject, region, upTo) ?? RuleTexts.Named(news.Alert.Key, self: false),
        { Rule: FunctionTestRule.RuleName } => OneLine.Of(news.Alert.Text).TrimEnd('.'),
        var key => RuleTexts.Named(key, self: false),
    };

    /// <summary>Null before any recording.</summary>
    public static LocalDate? LastRecorded(BriefSubject subject) =>
        subject.Days.LastOrDefault(day => day.State == DayState.Recorded)?.Date
        ?? (subject.Days is [.., { DaysSinceRecorded: { } since } last] ? last.Date.PlusDays(-since) : null);

    /// <summary><c>away since 2 March</c>; null for somebody who is not.</summary>
    /// <param name="date">Today, or the last date looked at.</param>
    public static string? Away(BriefSubject subject, LocalDate date, RoleView view)
    {
        if (Absence(subject, date) is not { } absence)
        {
            return null;
        }

        var since = subject.Days.Where(day => day.Date <= date).Reverse().TakeWhile(day => view.TellsTheSame(day.Plan.Absence, absence)).LastOrDefault()?.Date;
        return since is { } from ? $"{view.Word(absence)} since {Long(from)}" : view.Word(absence);
    }

    public static bool IsAway(BriefSubject subject, LocalDate date) => Absence(subject, date) is not null;

    private static AbsenceWord? Absence(BriefSubject subject, LocalDate date)
    {
        var known = subject.Days.LastOrDefault(day => day.Date <= date);
        return subject.Today is { } today && known?.Date != date ? today.Absence : known?.Plan.Absence;
    }

    private static string? Gap(BriefSubject subject, BodyRegion region, LocalDate upTo)
    {
        var day = subject.Days.LastOrDefault(day => day.Regions.GetValueOrDefault(region)?.DaysSince is not null);
        if (day?.Regions[region] is not { DaysSince: { } since } legs)
        {
            return null;
        }

        var work = KeyWords.RegionWork(new FindingKey(subject.Person.Id, "stimulus_gap", region));
        var last = day.Date.PlusDays(-since);
        return legs.Never ? $"no heavy or fast {work} seen since {Long(last)}, {Days(last, upTo)}" : $"no heavy or fast {work} since {Long(last)}, {Days(last, upTo)}";
    }

    private static string Days(LocalDate from, LocalDate to) => Period.DaysBetween(from, to) is var days && days == 1 ? "1 day" : $"{days} days";

    private static string Long(LocalDate date) => date.ToString("d MMMM", CultureInfo.InvariantCulture);
}
