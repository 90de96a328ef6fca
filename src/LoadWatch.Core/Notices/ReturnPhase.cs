using LoadWatch.Days;
using LoadWatch.Loads;

namespace LoadWatch.Notices;

/// <summary>Somebody back from a break: the days are counted, and the week stands beside the usual before the break instead of a ratio.</summary>
/// <param name="Day">Days since the return, from 1.</param>
/// <param name="Week">Load of the last 7 days, in <paramref name="Unit"/>; of a week that is not known whole, so far; null where too little is known.</param>
/// <param name="KnownDays">Days of these with a known load.</param>
/// <param name="UsualWeek">Mean week of the 28 days before the break; null where too little of them, or no break, is known.</param>
internal sealed record ReturnPhase(int Day, double? Week, int KnownDays, double? UsualWeek, string Unit)
{
    /// <summary>Days that may lie between the last day of the break and the return as told.</summary>
    private const int GapDays = 7;

    private const int WeekDays = 7;

    public string Remark => (Week, UsualWeek) switch
    {
        (_, null) => $"returning, day {Day}",
        (null, _) => $"returning, day {Day}: usually {BriefNumbers.Load(UsualWeek)} {Unit} a week before the break",
        _ => $"returning, day {Day}: this week {BriefNumbers.Load(Week)}{SoFar} of usually {BriefNumbers.Load(UsualWeek)} {Unit} before the break",
    };

    private string SoFar => KnownDays == WeekDays ? "" : $" so far ({KnownDays} of {WeekDays} days known)";

    /// <summary>Null outside of the days after a return.</summary>
    public static ReturnPhase? Of(BriefSubject subject, Day? today) => today?.Plan.ReturnDay is { } day
        ? Of(subject, today, day, [.. subject.Days.TakeLast(WeekDays).Where(one => one.Load is not null)])
        : null;

    private static ReturnPhase Of(BriefSubject subject, Day today, int day, List<Day> known) => new(
        day,
        today.Acute is null ? null : known.Sum(one => one.Load),
        known.Count,
        UsualBefore(subject.Days, today),
        LoadUnits.Of(subject.Group.LoadQuantity));

    /// <summary>The break ends at most <see cref="GapDays"/> before the return: a return that only the plan names has none.</summary>
    private static double? UsualBefore(IReadOnlyList<Day> days, Day today)
    {
        var oldest = today.Date.PlusDays(-today.Plan.ReturnDay!.Value - GapDays);
        var before = days.Reverse()
            .SkipWhile(day => day.Date >= today.Date || (day.Plan.Absence is null && day.Date >= oldest))
            .ToList();
        return before is [{ Plan.Absence: not null }, ..] ? before.SkipWhile(day => day.Plan.Absence is not null).FirstOrDefault()?.Chronic : null;
    }
}
