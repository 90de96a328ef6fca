using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Keeps sessions that were far beyond the others standing for some known dates.</summary>
/// <param name="holdDays">Known dates after a session's own on which it stands.</param>
/// <param name="before">Those that stood on the day before the first date.</param>
internal sealed class SpikeHold(int holdDays, SpikesStanding? before)
{
    private IReadOnlyList<StandingSpike> standing = before?.Spikes ?? [];

    /// <summary>First date of the unbroken run; null where nothing stands.</summary>
    public LocalDate? Since { get; private set; } = before?.Since;

    /// <summary>Of those that stand the gravest, then the latest, then the largest.</summary>
    public SessionSpike? Shown => standing
        .Select(one => one.Spike)
        .OrderByDescending(spike => spike.Severity)
        .ThenByDescending(spike => spike.Date)
        .ThenByDescending(spike => spike.Excess)
        .FirstOrDefault();

    /// <summary>What the next date needs; null where nothing stands.</summary>
    public SpikesStanding? State => Since is { } since ? new SpikesStanding(since, standing) : null;

    /// <summary>Takes every date in order; one that is unknown ends nothing (I-6).</summary>
    public void Pass(Day day, IEnumerable<SessionSpike> spikes)
    {
        var passed = day.State == DayState.Unknown ? 0 : 1;
        standing =
        [
            .. standing.Select(one => one with { KnownDaysSince = one.KnownDaysSince + passed }).Where(one => one.KnownDaysSince <= holdDays),
            .. spikes.Select(spike => new StandingSpike(spike, 0)),
        ];
        Since = standing.Count == 0 ? null : Since ?? day.Date;
    }
}

/// <param name="KnownDaysSince">Known dates after the session's own.</param>
internal sealed record StandingSpike(SessionSpike Spike, int KnownDaysSince);

internal sealed record SpikesStanding(LocalDate Since, IReadOnlyList<StandingSpike> Spikes) : IStanding
{
    LocalDate? IStanding.Since => Since;
}
