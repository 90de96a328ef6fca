using LoadWatch.Loads;
using LoadWatch.Recordings;

namespace LoadWatch.Days;

/// <summary>How large a session is, where sessions are compared with each other: a run by its distance, any session by its load.</summary>
internal static class SessionSize
{
    /// <summary>Metres of a run; null for any other sport, and where it has no distance.</summary>
    public static double? Run(Sport sport, double? metres) => sport.Name == "running" && metres > 0 ? metres : null;

    /// <summary>Null where unknown or nought.</summary>
    public static double? Load(double? load) => load > 0 ? load : null;

    /// <summary>The largest of a date by load, and the longest run; each null where there is none. A session whose load is already counted is not looked at.</summary>
    public static (double? Load, double? Run) Largest(IReadOnlyList<DaySession> sessions)
    {
        (double? Load, double? Run) largest = (null, null);
        foreach (var session in sessions)
        {
            if (session.AddsLoad)
            {
                double? metres = session.Quantities.TryGetValue(QuantityNames.Distance, out var distance) ? distance : null;
                largest = (Larger(largest.Load, Load(session.Load)), Larger(largest.Run, metres is null ? null : Run(Sport.Parse(session.Sport), metres)));
            }
        }

        return largest;
    }

    public static double? Larger(double? one, double? other) => one is null || other > one ? other : one;
}
