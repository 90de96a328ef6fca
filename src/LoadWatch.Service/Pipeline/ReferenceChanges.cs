using LoadWatch.Days;
using LoadWatch.Loads;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>When a person's reference values change, and their sessions by those of another date (I-15).</summary>
/// <param name="sessions">Made when first asked for: it reads histograms.</param>
public sealed class ReferenceChanges(ReferencePeriods periods, Func<RestatedSessions> sessions)
{
    private readonly Lazy<RestatedSessions> sessions = new(sessions);

    public ReferencePeriods Periods => periods;

    public DaySession In(ReferencePeriod period, LocalDate date, DaySession session) =>
        periods.On(date).Basis == period.Basis ? session : sessions.Value.In(period, date, session);
}
