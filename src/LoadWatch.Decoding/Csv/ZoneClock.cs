using NodaTime;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// Places local times in a zone. A time that the clocks skipped moves on by the length of the gap; one that came twice is the earlier,
/// unless the
/// rows would then run backwards. Both are counted, with the first line of each.
/// </summary>
internal sealed class ZoneClock(DateTimeZone zone)
{
    private readonly SteadyOffset steady = new(zone);

    public LineCount Skipped { get; } = new();

    public LineCount Ambiguous { get; } = new();

    public DateTimeZone Zone => zone;

    public Instant Place(LocalDateTime local, Instant? previous, CsvRows rows)
    {
        if (steady.Place(local) is { } sure)
        {
            return sure;
        }

        var mapping = zone.MapLocal(local);
        switch (mapping.Count)
        {
            case 0:
                Skipped.Add(rows.Line);
                return zone.AtLeniently(local).ToInstant();
            case 1:
                return mapping.Single().ToInstant();
            default:
                Ambiguous.Add(rows.Line);
                var early = mapping.First().ToInstant();
                return early < previous ? mapping.Last().ToInstant() : early;
        }
    }
}

/// <summary>How many lines something held for, and the first of them.</summary>
internal sealed class LineCount
{
    public long First { get; private set; }

    public int Count { get; private set; }

    public void Add(long line)
    {
        First = Count == 0 ? line : First;
        Count++;
    }
}
