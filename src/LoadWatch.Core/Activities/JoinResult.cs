using NodaTime;

namespace LoadWatch.Activities;

/// <param name="Activities">By date, then start, those without one last, then key.</param>
/// <param name="Questions">By date, then sentence.</param>
/// <param name="UnknownExercises">Words of set rows that the table of exercises does not hold, each once a date, by date, then word.</param>
public sealed record JoinResult(
    IReadOnlyList<JoinedActivity> Activities,
    IReadOnlyList<JoinQuestion> Questions,
    IReadOnlyList<UnknownExercise> UnknownExercises);

/// <summary>An exercise without a body region that was done on a date.</summary>
public sealed record UnknownExercise(LocalDate Date, string Word);

/// <summary>Rows that could not be joined, as a question to staff.</summary>
/// <param name="Sentence">Without a name: what is not clear and what would settle it.</param>
/// <param name="MayWait">The recording may only be late: to be asked some days later.</param>
public sealed record JoinQuestion(LocalDate Date, string Sentence, bool MayWait = false);
