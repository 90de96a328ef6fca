using NodaTime;

namespace LoadWatch.Activities;

/// <summary>One activity of recordings before rows join it.</summary>
/// <param name="LocalStart">Local date and time of its start.</param>
public sealed record RecordedActivity(RecordingSummary Winner, LocalDateTime LocalStart, ActivityValues Values);
