using LoadWatch.Rows;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Rows of answers as intake leaves them in the store of a working folder.</summary>
internal static class AnswerRows
{
    public const string Scope = "inbox/answers.csv";

    public static StoredRow Row(string subject, LocalDate date, AnswerRow answer, string? person = null, Instant? since = null) =>
        new(Scope, RowKind.Answers, "own", subject, person, date, $"{date:uuuu-MM-dd} {answer.Word}", since ?? WorkingFolder.Now, answer);

    public static AnswerRow Say(AnswerWord word, LocalDate? until = null, string? rule = null, string? file = null, string? by = null, string? note = null) =>
        new(word, until, rule, file, by, note);

    /// <summary>Puts these in place of all rows of the table, and beside them one that asks for nothing: the table is there.</summary>
    public static void PutRows(this WorkingFolder folder, params StoredRow[] rows) => folder.Write((_, session) =>
    {
        session.TableRows.Remove(session.TableRows.OfScope(Scope));
        session.TableRows.Put([.. rows, Row("cara", new LocalDate(2026, 1, 1), Say(AnswerWord.Seen), "cara")]);
        return true;
    });

    public static AnswersReport TakeUp(this WorkingFolder folder, Instant? now = null) =>
        folder.Write((workplace, session) => new Answers(workplace.Configuration, now ?? WorkingFolder.Now).TakeUp(session));

    public static IReadOnlyList<Decision> Decisions(this WorkingFolder folder) => folder.Read((_, session) => session.Decisions.All());

    public static IReadOnlyList<Decision> InForce(this WorkingFolder folder) => folder.Read((_, session) => session.Decisions.InForce());
}
