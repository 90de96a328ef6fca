using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Reads the week of a contact's groups from the days as they are stored.</summary>
internal static class BriefWeeks
{
    private const int WeekDays = 7;
    private const int MonthDays = 28;
    private const int NamedAtMost = 10;

    /// <summary>So many heavy-or-fast leg days of 28 were a habit, and so many must be known to say that it fell to half. Choices.</summary>
    private const int HabitDays = 4;

    private const int KnownDays = 20;

    /// <param name="date">The contact's date.</param>
    /// <param name="upTo">The last date looked at.</param>
    /// <param name="groups">The same people by group, in the order of the contact.</param>
    public static BriefWeek Of(IReadOnlyList<BriefSubject> shown, LocalDate date, LocalDate upTo, IEnumerable<IGrouping<string, BriefSubject>> groups, bool self)
    {
        var standing = shown.SelectMany(subject => Standing(subject, date, self)).ToList();
        var lost = shown.SelectMany(subject => Lost(subject, upTo, self)).ToList();
        return new BriefWeek(
            upTo.PlusDays(1 - WeekDays),
            upTo,
            [.. groups.Select(group => Group(group.First().Group, [.. group], upTo))],
            [.. standing.Take(NamedAtMost)],
            Math.Max(0, standing.Count - NamedAtMost),
            [.. lost.Take(NamedAtMost)],
            Math.Max(0, lost.Count - NamedAtMost));
    }

    private static WeekOfGroup Group(Group group, IReadOnlyList<BriefSubject> members, LocalDate upTo)
    {
        var weeks = members.Select(member => new TwoWeeks(member.Days, upTo)).ToList();
        return new WeekOfGroup(OneLine.Of(group.Name), [Load(weeks, LoadUnits.Of(group.LoadQuantity)), Recorded(weeks), Legs(weeks), Coverage(weeks, members.Count)]);
    }

    /// <summary>Like days with like days: an unknown Sunday takes the Sunday before out of the comparison, too.</summary>
    private static string Load(List<TwoWeeks> weeks, string unit)
    {
        var pairs = weeks.SelectMany(week => week.Pairs(day => day.Load)).ToList();
        return pairs.Count == 0
            ? "Load: no day of the week is known together with the same day of the week before."
            : $"Load: {BriefNumbers.Load(pairs.Sum(pair => pair.Now))} {unit} against {BriefNumbers.Load(pairs.Sum(pair => pair.Before))} on the same days of the week before"
                + $"{Change(pairs)}; {pairs.Count} of {weeks.Count * WeekDays} days are known in both weeks.";
    }

    private static string Change(List<(double Now, double Before)> pairs) => pairs.Sum(pair => pair.Before) is > 0 and var before
        ? FormattableString.Invariant($" ({(pairs.Sum(pair => pair.Now) / before) - 1:+0 %;-0 %;+0 %})")
        : "";

    private static string Recorded(List<TwoWeeks> weeks)
    {
        var (now, before) = (weeks.Sum(week => week.Now.Count(IsRecorded)), weeks.Sum(week => week.Before.Count(IsRecorded)));
        return $"Days with training: {now} against {before}.";
    }

    private static string Legs(List<TwoWeeks> weeks)
    {
        var pairs = weeks.SelectMany(week => week.Pairs(day => Heavy(day) is { } heavy ? heavy ? 1 : 0 : null)).ToList();
        return pairs.Count == 0
            ? "Heavy-or-fast leg days: unknown."
            : $"Heavy-or-fast leg days: {pairs.Sum(pair => pair.Now):0} against {pairs.Sum(pair => pair.Before):0}, on {pairs.Count} days that are known in both weeks.";
    }

    private static string Coverage(List<TwoWeeks> weeks, int people)
    {
        var known = weeks.Sum(week => week.Now.Count(day => day.Load is not null));
        var planned = weeks.SelectMany(week => week.Now).Where(day => day.Plan.Expected > 0).ToList();
        var came = planned.Count == 0 ? "" : $"; {planned.Count(IsRecorded)} of {planned.Count} planned days with a recording";
        return $"Coverage: {known} of {people * WeekDays} days known{came}.";
    }

    private static IEnumerable<BriefLine> Standing(BriefSubject subject, LocalDate date, bool self) => BriefBuilder.Active(subject)
        .Where(news => StaleAlerts.IsStale(news.Alert, date))
        .Select(news => new BriefLine(
            BriefBuilder.NameOf(subject.Person, self),
            OneLine.Sentence($"{RuleTexts.Named(news.Alert.Key, self)}: standing since {BriefNumbers.Day(news.Alert.StandsSince)}, {Period.DaysBetween(news.Alert.StandsSince, date)} days, and not acknowledged")));

    /// <summary>Whoever is away is not told of here.</summary>
    private static IEnumerable<BriefLine> Lost(BriefSubject subject, LocalDate upTo, bool self)
    {
        var days = subject.Days.Where(day => day.Date > upTo.PlusDays(-MonthDays) && day.Date <= upTo).ToList();
        var known = days.Count(day => Heavy(day) is not null);
        var before = subject.Days.FirstOrDefault(day => day.Date == upTo.PlusDays(-MonthDays))?.Regions.GetValueOrDefault(BodyRegion.Legs)?.Days28;
        var now = days.Count(day => Heavy(day) == true);
        if (known < KnownDays || before is not >= HabitDays || 2 * now > before || days[^1].Plan.Absence is not null)
        {
            yield break;
        }

        var of = known == MonthDays ? "" : $" ({known} of them known)";
        yield return new BriefLine(BriefBuilder.NameOf(subject.Person, self), $"Heavy or fast leg work on {now} of the last {MonthDays} days{of}, on {before} of the {MonthDays} before.");
    }

    private static bool IsRecorded(Day day) => day.State == DayState.Recorded;

    private static bool? Heavy(Day day) => day.Regions.GetValueOrDefault(BodyRegion.Legs)?.HeavyOrFast;

    private sealed class TwoWeeks(IReadOnlyList<Day> days, LocalDate upTo)
    {
        private readonly Dictionary<LocalDate, Day> byDate = days.Where(day => day.Date > upTo.PlusDays(-2 * WeekDays) && day.Date <= upTo).ToDictionary(day => day.Date);

        public IReadOnlyList<Day> Now => [.. byDate.Values.Where(day => day.Date > upTo.PlusDays(-WeekDays))];

        public IReadOnlyList<Day> Before => [.. byDate.Values.Where(day => day.Date <= upTo.PlusDays(-WeekDays))];

        public IEnumerable<(double Now, double Before)> Pairs(Func<Day, double?> value) =>
            from day in Now
            let before = byDate.GetValueOrDefault(day.Date.PlusDays(-WeekDays))
            where before is not null && value(day) is not null && value(before) is not null
            select (value(day)!.Value, value(before)!.Value);
    }
}
