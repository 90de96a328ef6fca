// An alert that stands for long and that nobody says to have seen is one that nobody needs, or that nobody was told of (IEC 62682 and ANSI/ISA-18.2 call it stale
// after a day, from memory; for the pace of training 14 days are a choice).
using NodaTime;

namespace LoadWatch.Alerts;

/// <summary>Alerts that have stood for long without anybody having seen them.</summary>
public static class StaleAlerts
{
    /// <summary>Longer than this, days.</summary>
    public const int Days = 14;

    /// <param name="date">The date on which it is asked.</param>
    public static bool IsStale(Alert alert, LocalDate date) => alert is { IsTold: true, State: AlertState.Unacknowledged } && alert.StandsSince < date.PlusDays(-Days);
}
