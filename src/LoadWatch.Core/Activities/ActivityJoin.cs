using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;

namespace LoadWatch.Activities;

/// <summary>
/// Joins what tables tell of a person's sessions to the recordings of them: session rows (ratings, tracking, declared content) and set logs. A row never
/// adds a second session of what a recording holds (I-9): it joins the one recording that it fits; where several fit, or a mere rating has none, it is shown
/// as a question and its load does not count. Rows that fit none and tell enough stand for a session of their own, until the recording comes. Pure, and the
/// order of recordings and rows does not matter (I-5).
/// </summary>
public static class ActivityJoin
{
    /// <param name="recorded">Of the person; each becomes exactly one activity.</param>
    /// <param name="rows">Of the person, in force; kinds other than sessions and sets are passed over.</param>
    public static JoinResult Join(
        Person person, IReadOnlyList<RecordedActivity> recorded, IReadOnlyList<OwnedRow> rows, AnchorBook anchors, ComputationSettings settings)
    {
        var recordings = recorded.ToLookup(one => one.LocalStart.Date);
        var stated = StatedSessions.Of(rows).Concat(SetLists.Of(rows, person, anchors, settings)).ToLookup(one => one.Date);
        var dates = recordings.Select(date => date.Key).Union(stated.Select(date => date.Key)).Order();
        var joined = dates.Select(date => new DateJoin(recordings[date], stated[date])).ToList();
        var sessions = joined.SelectMany(date => date.Sessions).Select(session => JoinedSession.Of(session, person, settings)).ToList();
        return new JoinResult(
            InOrder(sessions.Select(session => session.Activity)),
            InOrder([.. joined.SelectMany(date => date.Questions), .. sessions.Select(session => session.Question).OfType<JoinQuestion>()]),
            UnknownExercises(rows, settings));
    }

    private static IReadOnlyList<JoinedActivity> InOrder(IEnumerable<JoinedActivity> activities) => [.. activities
        .OrderBy(one => one.Date)
        .ThenBy(one => one.Start is null)
        .ThenBy(one => one.Start)
        .ThenBy(one => one.Key, StringComparer.Ordinal)];

    private static IReadOnlyList<JoinQuestion> InOrder(IEnumerable<JoinQuestion> questions) =>
        [.. questions.Distinct().OrderBy(one => one.Date).ThenBy(one => one.Sentence, StringComparer.Ordinal)];

    private static IReadOnlyList<UnknownExercise> UnknownExercises(IEnumerable<OwnedRow> rows, ComputationSettings settings) => [.. rows
        .Where(row => row.Content is SetRow)
        .Select(row => (row.Date, Word: ExerciseWord.Canonical(SetRows.Exercise((SetRow)row.Content))))
        .Where(done => done.Word is { } word && !settings.Exercises.ContainsKey(word))
        .Select(done => new UnknownExercise(done.Date, done.Word!))
        .Distinct()
        .OrderBy(done => done.Date)
        .ThenBy(done => done.Word, StringComparer.Ordinal)];
}
