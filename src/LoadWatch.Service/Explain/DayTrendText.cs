using System.Globalization;
using System.Text;
using LoadWatch.Days;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Explain;

/// <summary>What a day tells beside its sums of load: converted loads with their error, the usual week, the largest sessions, heavy-or-fast days with their coverage.</summary>
internal static class DayTrendText
{
    /// <param name="withSessions">The same day as it keeps its sessions; empty where it is not read.</param>
    public static void Append(StringBuilder text, Day day, IReadOnlyList<Day> withSessions)
    {
        foreach (var session in withSessions.SelectMany(one => one.Sessions).Where(session => session.ConvertedFrom is not null))
        {
            var error = session.LoadError is { } known ? $"standard error {Number(known)}, that of the line through the own sessions that have both" : "taken as it is, in its own unit: there are no own sessions to convert it by";
            text.AppendLine(CultureInfo.InvariantCulture, $"    load {Number(session.Load)} of the session {session.Key[..Math.Min(12, session.Key.Length)]} from {session.ConvertedFrom} (estimated): {error}");
        }

        if (day.LoadError is not null)
        {
            Line(text, "standard error of the load: root of the sum of squares of those of its converted sessions", day.LoadError);
        }

        Line(text, "usual week: median of the 8 newest ordinary weeks of the 16 before these 7 days", day.UsualWeek);
        Line(text, "change against the last ordinary week, fraction", day.WeeklyChangeOrdinary);
        Line(text, "largest session of 30 days, by load", day.LargestSession30);
        Line(text, "longest run of 30 days, metres", day.LongestRunMetres30);
        foreach (var (region, state) in day.Regions.OrderBy(pair => pair.Key))
        {
            AppendRegion(text, region, state);
        }
    }

    private static void AppendRegion(StringBuilder text, BodyRegion region, RegionDay state)
    {
        var heavy = state.HeavyOrFast switch { true => "yes", false => "no", null => "unknown" };
        text.AppendLine(CultureInfo.InvariantCulture, $"    {BodyRegions.Word(region)}: heavy or fast {heavy}, days since {Number(state.DaysSince)}, usual gap in days {Number(state.UsualGapDays)}");
        text.AppendLine(CultureInfo.InvariantCulture, $"        in 7 days {Number(state.Days7)} ({state.Known7} known), in 14 days {Number(state.Days14)} ({state.Known14} known, usually {Number(state.Usual14)}), in 28 days {Number(state.Days28)} ({state.Known28} known)");
    }

    /// <summary>A figure of a day with its name, on a line of its own.</summary>
    internal static void Line(StringBuilder text, string name, double? value) => text.AppendLine(CultureInfo.InvariantCulture, $"    {name} = {Number(value)}");

    internal static string Number(double? value) => value is { } known ? known.ToString("0.###", CultureInfo.InvariantCulture) : "unknown";
}
