using NodaTime;

namespace LoadWatch.Activities;

/// <summary>One activity of recordings before rows join it.</summary>
/// <param name="Winner">The winning recording, with what all recordings of the activity together say of the session.</param>
/// <param name="LocalStart">Its start on the clock of the person's days (<see cref="People.PersonDay.Clock"/>): its date is the one that it counts for.</param>
public sealed record RecordedActivity(RecordingSummary Winner, LocalDateTime LocalStart, ActivityValues Values)
{
    /// <summary>Of all its recordings, whichever of them count.</summary>
    public IReadOnlyList<string> Sources { get; init; } = [Winner.Source];
}
