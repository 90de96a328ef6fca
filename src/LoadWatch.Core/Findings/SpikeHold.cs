using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Keeps sessions that were far beyond the others standing for some known dates.</summary>
/// <param name="holdDays">Known dates after a session's own on which it stands.</param>
internal sealed class SpikeHold(int holdDays)
{
    private List<(SessionSpike Spike, int KnownDaysSince)> standing = [];

    /// <summary>First date of the unbroken run; null where nothing stands.</summary>
    public LocalDate? Since { get; private set; }

    /// <summary>Of those that stand the gravest, then the latest, then the largest.</summary>
    public SessionSpike? Shown => standing
        .Select(one => one.Spike)
        .OrderByDescending(spike => spike.Severity)
        .ThenByDescending(spike => spike.Date)
        .ThenByDescending(spike => spike.Excess)
        .FirstOrDefault();

    /// <summary>Takes every date in order; one that is unknown ends nothing (I-6).</summary>
    public void Pass(Day day, IEnumerable<SessionSpike> spikes)
    {
        var passed = day.State == DayState.Unknown ? 0 : 1;
        standing =
        [
            .. standing.Select(one => (one.Spike, one.KnownDaysSince + passed)).Where(one => one.Item2 <= holdDays),
            .. spikes.Select(spike => (spike, 0)),
        ];
        Since = standing.Count == 0 ? null : Since ?? day.Date;
    }
}
