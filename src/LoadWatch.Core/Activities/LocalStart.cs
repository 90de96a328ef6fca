using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>When a recording began on the clock of its place.</summary>
public static class LocalStart
{
    /// <summary>The device's own offset, else the person's zone.</summary>
    /// <exception cref="ArgumentException">The recording carries no date.</exception>
    public static OffsetDateTime Of(Recording recording, Person person)
    {
        var start = recording.Start ?? throw new ArgumentException("the recording carries no date", nameof(recording));
        return start.WithOffset(recording.LocalOffset ?? person.Zone.GetUtcOffset(start));
    }

    /// <summary>The date that it counts for.</summary>
    /// <inheritdoc cref="Of"/>
    public static LocalDate DateOf(Recording recording, Person person) => PersonDay.Of(Of(recording, person).LocalDateTime, person);
}
