using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Rows;
using NodaTime;
using static LoadWatch.Service.Tests.Pipeline.AnswerRows;
using DayWordRow = LoadWatch.Rows.DayRow;

namespace LoadWatch.Service.Tests.Pipeline;

public sealed class PersonPlansTests : IDisposable
{
    private static readonly LocalDate Today = new(2026, 6, 15);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void LinesOfThePlanAreOfEverybodyOfAGroupOrOfOnePerson()
    {
        Put(
            Plan("", null, 1, new PlanRow(PlanWord.OffSeason, Today.PlusDays(20), null, null, false, null)),
            Plan("Squad", null, 2, new PlanRow(PlanWord.TeamSession, null, new LocalTime(17, 0), new LocalTime(18, 30), true, "soccer")),
            Plan("7", "anna", 3, new PlanRow(PlanWord.Returning, null, null, null, false, null)),
            Plan("nobody", null, 4, new PlanRow(PlanWord.Rest, null, null, null, false, null)));

        Assert.Equal([PlanWord.OffSeason, PlanWord.TeamSession, PlanWord.Returning], Of("anna").Entries.Select(entry => entry.Word));
        Assert.Equal([PlanWord.OffSeason, PlanWord.TeamSession], Of("bo").Entries.Select(entry => entry.Word));
        Assert.Equal(
            new PlanEntry(PlanWord.TeamSession, Today.PlusDays(2), Today.PlusDays(2), new LocalTime(17, 0), new LocalTime(18, 30), true, "soccer"),
            Of("bo").Entries[1]);
        Assert.Equal(Today.PlusDays(20), Of("bo").Entries[0].Until);
    }

    [Fact]
    public void DayTablesGiveAbsencesRestAndAttendance()
    {
        Put(Day(1, DayWord.Ill), Day(2, DayWord.Ill), Day(3, DayWord.Rest), Day(4, DayWord.Attended), Day(5, DayWord.Absent));

        var plan = Of("anna");

        Assert.Equal([new Absence(AbsenceWord.Ill, Today.PlusDays(1), Today.PlusDays(2))], plan.Absences);
        Assert.Equal([(Today.PlusDays(3), "days")], plan.Rests.Select(pair => (pair.Key, pair.Value)));
        Assert.Equal([(Today.PlusDays(4), true), (Today.PlusDays(5), false)], plan.Attendance.OrderBy(pair => pair.Key).Select(pair => (pair.Key, pair.Value)));
        Assert.Empty(Of("bo").Absences);
    }

    [Fact]
    public void DecisionsInForceGiveAbsencesReturnsRestAndMatches()
    {
        folder.PutRows(
            Row("anna", Today, Say(AnswerWord.Ill)),
            Row("anna", Today.PlusDays(8), Say(AnswerWord.Returning)),
            Row("anna", Today.PlusDays(10), Say(AnswerWord.Rest, until: Today.PlusDays(11))),
            Row("anna", Today.PlusDays(14), Say(AnswerWord.Match)));
        Put(Day(10, DayWord.Rest), Day(12, DayWord.Rest));
        folder.TakeUp();

        var plan = Of("anna");

        Assert.Equal([new Absence(AbsenceWord.Ill, Today, Today.PlusDays(7))], plan.Absences);
        Assert.Equal([Today.PlusDays(8)], plan.Returns);
        Assert.Equal(["answers", "answers", "days"], plan.Rests.OrderBy(pair => pair.Key).Select(pair => pair.Value));
        Assert.True(plan.On(Today.PlusDays(14)).IsMatch);
        Assert.Equal((1, AbsenceWord.Ill), (plan.On(Today.PlusDays(8)).ReturnDay, plan.On(Today.PlusDays(7)).Absence));
        Assert.Equivalent(plan, folder.Read((workplace, session) => new PersonPlans(workplace.Configuration).Of(session, workplace.Configuration.People["anna"], Today.PlusDays(-30), Today.PlusDays(30))));

        folder.PutRows();
        folder.TakeUp();
        Assert.Empty(Of("anna").Absences);
    }

    /// <summary>Of equal lines the one seen later counts, also where it no longer speaks for the range.</summary>
    [Fact]
    public void ARangeOfDatesReadsTheLinesThatSpeakForIt()
    {
        Put(
            Plan("", null, 1, new PlanRow(PlanWord.OffSeason, Today.PlusDays(20), null, null, false, null)),
            Plan("Squad", null, 2, new PlanRow(PlanWord.TeamSession, null, null, null, true, null)),
            Plan("other", null, 3, new PlanRow(PlanWord.LightWeek, Today.PlusDays(30), null, null, false, null)),
            Plan("", null, 4, new PlanRow(PlanWord.LightWeek, Today.PlusDays(40), null, null, false, null)),
            Plan("", null, 4, new PlanRow(PlanWord.LightWeek, Today.PlusDays(6), null, null, false, null)) with { Scope = "inbox/later.csv", Since = WorkingFolder.Now.Plus(Duration.FromHours(1)) });

        Assert.Equal([PlanWord.OffSeason], In(10, 20));
        Assert.Equal([PlanWord.OffSeason, PlanWord.TeamSession], In(2, 3));
        Assert.Empty(In(21, 60));

        IEnumerable<PlanWord> In(int from, int to) => folder.Read((workplace, session) => new PersonPlans(workplace.Configuration)
            .Of(session, workplace.Configuration.People["anna"], Today.PlusDays(from), Today.PlusDays(to)).Entries.Select(entry => entry.Word).ToList());
    }

    private PersonPlan Of(string person) => folder.Read((workplace, session) => new PersonPlans(workplace.Configuration).Of(session)[person]);

    private void Put(params StoredRow[] rows) => folder.Write((_, session) =>
    {
        session.TableRows.Put(rows);
        return true;
    });

    private static StoredRow Plan(string subject, string? person, int day, PlanRow row) =>
        new("inbox/plan.csv", RowKind.Plan, "own", subject, person, Today.PlusDays(day), $"{day}", WorkingFolder.Now, row);

    private static StoredRow Day(int day, DayWord word) =>
        new("inbox/days.csv", RowKind.Days, "own", "anna", "anna", Today.PlusDays(day), $"{day}", WorkingFolder.Now, new DayWordRow(word));
}
