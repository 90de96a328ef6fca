using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Storage.Recordings;

/// <summary>When something of a session was seen first.</summary>
/// <param name="Date">Of a table's rows; null for a recording.</param>
/// <param name="Start">Of a recording; null for a table's rows.</param>
/// <param name="LocalOffset">Of the recording's place.</param>
public sealed record FirstSight(LocalDate? Date, Instant? Start, Offset LocalOffset, Instant Seen)
{
    /// <summary>The date that it counts for.</summary>
    public LocalDate Recorded(Person person) => Date ?? PersonDay.Of(Start!.Value.WithOffset(LocalOffset).LocalDateTime, person);
}
