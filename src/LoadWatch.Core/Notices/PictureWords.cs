namespace LoadWatch.Notices;

/// <summary>A picture in plain words: everything that can be read from it, day by day left aside.</summary>
internal static class PictureWords
{
    private const int WeekDays = 7;

    public static string Of(PersonPicture picture)
    {
        var days = picture.Days;
        return $"{days.Count} days to {BriefNumbers.Day(picture.Last)}. {Weeks(picture)} {Bars(picture)} {Legs(days)}";
    }

    private static string Weeks(PersonPicture picture)
    {
        var known = picture.Days.TakeLast(WeekDays).Where(day => day.Load is not null).ToList();
        var week = (picture.WeekLoads[^1], known.Count) switch
        {
            ({ } load, WeekDays) => $"{BriefNumbers.Load(load)} {picture.Unit}",
            (_, 0) => "unknown",
            _ => $"{BriefNumbers.Load(known.Sum(day => day.Load))} {picture.Unit} so far, {known.Count} of {WeekDays} days known",
        };
        var usual = picture.Usual is { } weeks ? $"{Range(weeks)} {picture.Unit}, the middle half of {weeks.Count} weeks" : "not known yet";
        return $"The last 7 days: {week}; a usual week: {usual}.";
    }

    private static string Range(UsualWeeks weeks)
    {
        var (low, high) = (BriefNumbers.Load(weeks.Low), BriefNumbers.Load(weeks.High));
        return low == high ? low : $"{low} to {high}";
    }

    private static string Bars(PersonPicture picture)
    {
        var days = picture.Days;
        return $"Load on {Count(days.Count(day => day.Load is > 0))}{Highest(picture)}; none on {days.Count(day => day.Load is 0)}"
            + Also("unknown", days.Count(day => !day.Known))
            + Also("trained without a load that could be computed", days.Count(day => day.Known && day.Load is null)) + ".";
    }

    /// <summary>Of equal ones the latest.</summary>
    private static string Highest(PersonPicture picture) => picture.Days.Where(day => day.Load is > 0).Reverse().MaxBy(day => day.Load) is { } day
        ? $", the highest {BriefNumbers.Load(day.Load)} {picture.Unit} on {BriefNumbers.Day(day.Date)}"
        : "";

    private static string Legs(IReadOnlyList<BriefDay> days)
    {
        var last = days.LastOrDefault(day => day.HeavyLegs == true);
        var when = last is null ? "" : $", the last on {BriefNumbers.Day(last.Date)}";
        return $"Heavy or fast leg work on {Count(days.Count(day => day.HeavyLegs == true))}{when}{Also("unknown", days.Count(day => day.HeavyLegs is null))}.";
    }

    private static string Also(string what, int days) => days == 0 ? "" : $"; {what} on {days}";

    private static string Count(int days) => days == 1 ? "1 day" : $"{days} days";
}
