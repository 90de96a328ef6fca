using System.Runtime.InteropServices;
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Loads;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Compares single sessions with those of the days before.</summary>
internal sealed class SessionSizes(RuleSubject subject)
{
    private readonly SessionSpikeLimits limits = subject.Limits.SessionSpike;
    private readonly List<JoinedActivity> sessions = [.. subject.Activities.Where(activity => activity.AddsLoad)];
    private readonly SensorFaults faults = new(subject);

    /// <summary>The sessions of a date that lie beyond the largest before.</summary>
    public IEnumerable<SessionSpike> Spikes(LocalDate date)
    {
        var today = On(date, date);
        if (today.Count == 0)
        {
            return [];
        }

        var before = On(date.PlusDays(-limits.LookBackDays), date.PlusDays(-1));
        var runs = Sizes(before, Run);
        var loads = Sizes(before, Load);
        return today.Select(session => Judge(session, runs, loads)).OfType<SessionSpike>();
    }

    /// <summary>A run with a distance goes by it where enough such runs lie before; every other session goes by its load.</summary>
    private SessionSpike? Judge(JoinedActivity session, List<Size> runs, List<Size> loads) => Run(session) is { } metres && runs.Count >= limits.RunsWanted
        ? Beyond(session.Date, ofRun: true, metres, runs, limits.RunNotice, limits.RunWarning)
        : Load(session) is { } load && loads.Count >= limits.SessionsWanted
            ? Beyond(session.Date, ofRun: false, load, loads, limits.LoadNotice, limits.LoadWarning)
            : null;

    private static SessionSpike? Beyond(LocalDate date, bool ofRun, double value, List<Size> before, double notice, double warning)
    {
        var largest = before.MaxBy(size => size.Value);
        var excess = Significant.Round((value - largest.Value) / largest.Value);
        var severity = excess >= warning ? Severity.Warning : Severity.Notice;
        return excess < notice ? null : new SessionSpike(date, ofRun, value, largest.Value, largest.Date, before.Count, excess, severity);
    }

    private static double? Run(JoinedActivity session) => SessionSize.Run(session.Sport, session[QuantityNames.Distance]);

    /// <summary>Null as well where it was read from a sensor that failed.</summary>
    private double? Load(JoinedActivity session) => faults.Mutes(session, subject.LoadQuantity)
        ? null
        : SessionSize.Load(subject.SessionLoads is { } loads ? loads.GetValueOrDefault(session.Key) : session[subject.LoadQuantity]);

    private static List<Size> Sizes(List<JoinedActivity> before, Func<JoinedActivity, double?> of) =>
        [.. before.Where(session => of(session).HasValue).Select(session => new Size(session.Date, of(session)!.Value))];

    private List<JoinedActivity> On(LocalDate from, LocalDate until)
    {
        var first = FirstFrom(from);
        return sessions.GetRange(first, FirstFrom(until.PlusDays(1)) - first);
    }

    private int FirstFrom(LocalDate date) => Sorted.FirstFrom(CollectionsMarshal.AsSpan(sessions), date, session => session.Date);

    private readonly record struct Size(LocalDate Date, double Value);
}
