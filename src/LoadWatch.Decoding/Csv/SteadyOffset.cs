using NodaTime;
using NodaTime.TimeZones;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// Remembers the stretch in which a zone last kept one offset. Where a local time lies more than a day inside it, no change of the clocks is near and the offset
/// is sure.
/// </summary>
internal sealed class SteadyOffset(DateTimeZone zone)
{
    private ZoneInterval? steady;
    private (LocalDateTime Local, Instant Instant)? placed;
    private LocalDateTime from;
    private LocalDateTime to;

    /// <summary>The moment of a local time, or null where only the zone itself can tell.</summary>
    public Instant? Place(LocalDateTime local)
    {
        // Rows of many people stand moment by moment.
        if (placed is { } same && same.Local == local)
        {
            return same.Instant;
        }

        if (local.Calendar != CalendarSystem.Iso)
        {
            return null;
        }

        if (steady is null || local < from || local > to)
        {
            Remember(zone.MapLocal(local).EarlyInterval);
        }

        if (steady is not { } interval || local < from || local > to)
        {
            return null;
        }

        var instant = local.WithOffset(interval.WallOffset).ToInstant();
        placed = (local, instant);
        return instant;
    }

    private void Remember(ZoneInterval interval)
    {
        steady = interval;
        from = interval.HasStart ? interval.IsoLocalStart.PlusDays(1) : Years(1);
        to = interval.HasEnd ? interval.IsoLocalEnd.PlusDays(-1) : Years(9999);
    }

    private static LocalDateTime Years(int year) => new(year, 1, 1, 0, 0);
}
