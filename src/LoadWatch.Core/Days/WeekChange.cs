using NodaTime;

namespace LoadWatch.Days;

/// <summary>A week against the last one before it that means something: (A - B) / B.</summary>
/// <param name="Acute">A, load of the week.</param>
/// <param name="BeforeUpTo">Last date of the newest week before it that is not skipped (<see cref="PastWeek.IsSkipped"/>).</param>
/// <param name="Before">B, load of that week.</param>
/// <param name="Fraction">0.4 is 40 % more.</param>
internal readonly record struct WeekChange(double Acute, LocalDate BeforeUpTo, double Before, double Fraction)
{
    /// <summary>Null where one of the two is not known, or all weeks before are skipped.</summary>
    /// <param name="before">Weeks before, the newest first.</param>
    public static WeekChange? Of(double? acute, IEnumerable<PastWeek> before)
    {
        var last = before.FirstOrDefault(week => !week.IsSkipped);
        return acute is { } week && last.Load is { } load ? new WeekChange(week, last.UpTo, load, Significant.Round((week - load) / load)) : null;
    }
}
