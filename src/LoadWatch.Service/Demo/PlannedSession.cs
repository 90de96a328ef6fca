using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>One session that a person of the demo will do.</summary>
/// <param name="HeartRateSeen">False where the strap gave 0 throughout.</param>
public sealed record PlannedSession(LocalDate Date, WeekSlot Slot, bool HeartRateSeen = true)
{
    public LocalDateTime Start => Date + Slot.At;
}
