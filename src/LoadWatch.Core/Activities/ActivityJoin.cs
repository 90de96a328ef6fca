using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>One activity of recordings before rows join it.</summary>
/// <param name="LocalStart">Local date and time of its start.</param>
public sealed record RecordedActivity(RecordingSummary Winner, LocalDateTime LocalStart, ActivityValues Values);

/// <summary>A table row in force, of a person.</summary>
/// <param name="Layout">Name of the layout that read it: its source (I-6).</param>
public sealed record OwnedRow(string Layout, LocalDate Date, string Key, RowContent Content);

/// <summary>Rows that could not be joined, as a question to staff.</summary>
/// <param name="Sentence">Without a name: what is not clear and what would settle it.</param>
public sealed record JoinQuestion(LocalDate Date, string Sentence);

/// <param name="Activities">By date, then start, then key.</param>
/// <param name="Questions">By date, then sentence.</param>
public sealed record JoinResult(IReadOnlyList<JoinedActivity> Activities, IReadOnlyList<JoinQuestion> Questions);
