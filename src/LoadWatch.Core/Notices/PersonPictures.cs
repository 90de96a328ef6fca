// Quartiles by linear interpolation between the ordered values, h = (n - 1) p: definition 7 of Hyndman and Fan 1996, "Sample quantiles in statistical
// packages", The American Statistician 50:361-365 (from memory). The number of weeks is a choice.
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Reads the picture of somebody to look at from the days as they are stored.</summary>
internal static class PersonPictures
{
    private const int WeekDays = 7;
    private const int KnownOf7 = 5;
    private const int UsualWithinWeeks = 12;
    private const int UsualAtMost = 8;
    private const int UsualAtLeast = 4;

    /// <param name="upTo">The last date of the brief; dates without a day are unknown.</param>
    public static PersonPicture Of(BriefSubject subject, LocalDate upTo)
    {
        var days = subject.Days.ToDictionary(day => day.Date);
        return new PersonPicture(
            [.. Enumerable.Range(1 - PersonPicture.DayCount, PersonPicture.DayCount).Select(offset => BriefRows.DayOf(days, upTo.PlusDays(offset)))],
            [.. Enumerable.Range(1 - (PersonPicture.DayCount / WeekDays), PersonPicture.DayCount / WeekDays)
                .Select(weeks => days.GetValueOrDefault(upTo.PlusDays(weeks * WeekDays))?.Acute)],
            Usual(subject.Days, upTo.PlusDays(-WeekDays)),
            OneLine.Of(LoadUnits.Of(subject.Group.LoadQuantity)));
    }

    private static UsualWeeks? Usual(IReadOnlyList<Day> days, LocalDate last)
    {
        var index = days.Count - 1;
        while (index >= 0 && days[index].Date > last)
        {
            index--;
        }

        var loads = PastWeek.Before(days, index, UsualWithinWeeks, KnownOf7).Where(week => week.IsOrdinary).Take(UsualAtMost).Select(week => week.Load!.Value).Order().ToList();
        return loads.Count < UsualAtLeast ? null : new UsualWeeks(Quantile(loads, 0.25), Quantile(loads, 0.75), loads.Count);
    }

    private static double Quantile(List<double> ordered, double share)
    {
        var place = (ordered.Count - 1) * share;
        var below = (int)Math.Floor(place);
        var above = Math.Min(below + 1, ordered.Count - 1);
        return Significant.Round(ordered[below] + ((place - below) * (ordered[above] - ordered[below])));
    }
}
