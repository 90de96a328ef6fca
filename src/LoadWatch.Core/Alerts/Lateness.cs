// How late a person's recordings usually come in: the 0.9 quantile, by nearest rank upward (the value of rank ceil(q n) of n sorted values), of the days from a
// date with a recording to the date in whose night something of it was seen first. All numbers are a choice.
using NodaTime;

namespace LoadWatch.Alerts;

/// <summary>
/// How late recordings usually come in. What rests on recordings that are not there is not told before they had that time (an on-delay after IEC 62682).
/// </summary>
/// <param name="Days">0: in the night of their date, or not known.</param>
/// <param name="Dates">Dates with a recording that it rests on, count.</param>
public sealed record Lateness(int Days, int Dates)
{
    /// <summary>How far back dates are looked at, days.</summary>
    public const int LookBackDays = 84;

    /// <summary>The share of the dates that had come after <see cref="Days"/>.</summary>
    public const double Quantile = 0.9;

    /// <summary>Of fewer dates nothing is known, count.</summary>
    public const int DatesWanted = 6;

    /// <summary>What is older when it comes is a back-fill and says nothing of the usual, days.</summary>
    public const int OldestDays = 14;

    public static Lateness Unknown { get; } = new(0, 0);

    /// <param name="came">
    /// Dates with a recording, each with the last date that was over when something of it was first seen; in any order. The first night that brought any of them
    /// is left out: it brought the past.
    /// </param>
    /// <param name="date">The evaluation date: later ones are passed over.</param>
    public static Lateness Of(IReadOnlyCollection<(LocalDate Recorded, LocalDate Came)> came, LocalDate date)
    {
        if (came.Count == 0)
        {
            return Unknown;
        }

        var firstNight = came.Min(one => one.Came);
        var late = came
            .Where(one => one.Recorded > date.PlusDays(-LookBackDays) && one.Recorded <= date)
            .GroupBy(one => one.Recorded, one => one.Came)
            .Where(one => one.Min() > firstNight)
            .Select(one => Math.Max(0, Period.DaysBetween(one.Key, one.Min())))
            .Where(days => days <= OldestDays)
            .Order()
            .ToList();
        return late.Count < DatesWanted ? Unknown : new Lateness(late[(int)Math.Ceiling(Significant.Round(Quantile * late.Count)) - 1], late.Count);
    }
}
