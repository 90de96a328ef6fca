using NodaTime;

namespace LoadWatch.Notices;

/// <summary>The last 56 days of somebody to look at, as values to draw and as words that say the same. It names nobody and tells nothing of health (I-12).</summary>
/// <param name="Days">The 56 dates, oldest first.</param>
/// <param name="WeekLoads">Load of each of the eight times seven days, oldest first, in <paramref name="Unit"/>; null where too little is known.</param>
/// <param name="Usual">Null where too few ordinary weeks are known.</param>
/// <param name="Unit">The group's unit of load.</param>
public sealed record PersonPicture(IReadOnlyList<BriefDay> Days, IReadOnlyList<double?> WeekLoads, UsualWeeks? Usual, string Unit)
{
    public const int DayCount = 56;

    /// <summary>Which days they are, and in what the load is counted.</summary>
    public string Caption => $"{BriefNumbers.Day(First)} to {BriefNumbers.Day(Last)}, {Unit} a day{(Usual is null ? "" : "; grey: usual weeks")}";

    /// <summary>What the picture says, for who reads text or hears the page.</summary>
    public string Words => PictureWords.Of(this);

    public LocalDate First => Days[0].Date;

    public LocalDate Last => Days[^1].Date;
}

/// <summary>The load of a person's usual weeks: the middle half of the ordinary weeks before the last seven days.</summary>
/// <param name="Low">Load of a week at the lower quartile.</param>
/// <param name="High">Load of a week at the upper quartile.</param>
/// <param name="Count">How many weeks there were.</param>
public sealed record UsualWeeks(double Low, double High, int Count);
