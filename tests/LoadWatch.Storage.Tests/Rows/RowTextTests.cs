using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Storage.Tests.Rows;

public sealed class RowTextTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void DatesAndTimesOfRowsAreReadAsTheyWereWritten()
    {
        var plan = Row(RowKind.Plan, new PlanRow(PlanWord.TeamSession, Some.Date.PlusDays(3), new LocalTime(17, 30), new LocalTime(19, 0, 5), true, "soccer"));
        var answer = Row(RowKind.Answers, new AnswerRow(AnswerWord.Shelve, Some.Date.PlusDays(9), "silence", null, "Kim", null));
        Store.Write(session => session.TableRows.Put([plan, answer]));

        Assert.Equal([plan], Store.Read(session => session.TableRows.OfKind(RowKind.Plan)));
        Assert.Equal([answer], Store.Read(session => session.TableRows.OfKind(RowKind.Answers)));
    }

    [Fact]
    public void ADateIsWrittenByItsIsoForm() => Assert.Equal(
        """{"word":"ill","until":"2026-03-10","rule":null,"file":null,"by":null,"note":null}""",
        RowText.Write(new AnswerRow(AnswerWord.Ill, new LocalDate(2026, 3, 10), null, null, null, null)));

    private static StoredRow Row(RowKind kind, RowContent content) => new("inbox/table.csv", kind, "own", "anna", "anna", Some.Date, "k", Some.Moment, content);
}
