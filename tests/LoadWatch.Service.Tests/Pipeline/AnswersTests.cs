using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Decisions;
using NodaTime;
using static LoadWatch.Service.Tests.Pipeline.AnswerRows;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Rows about people's dates and files; those about alerts are in <see cref="AlertAnswersTests"/>.</summary>
public sealed class AnswersTests : IDisposable
{
    private static readonly LocalDate Today = new(2026, 6, 15);

    private static readonly Instant Later = WorkingFolder.Now + Duration.FromHours(2);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData(AnswerWord.Ill, DecisionKind.Ill)]
    [InlineData(AnswerWord.Injured, DecisionKind.Injured)]
    [InlineData(AnswerWord.Away, DecisionKind.Away)]
    [InlineData(AnswerWord.Returning, DecisionKind.Returning)]
    [InlineData(AnswerWord.Rest, DecisionKind.Rest)]
    [InlineData(AnswerWord.Match, DecisionKind.Match)]
    public void ARowMakesItsDecision(AnswerWord word, DecisionKind kind)
    {
        folder.PutRows(Row("Anna Ahola", Today.PlusDays(-3), Say(word, by: " Kim ", note: "")));

        var report = folder.TakeUp();

        Assert.Equal((1, 0, 0), (report.Made, report.Withdrawn, report.Questions.Count));
        var expected = new Decision(kind, "anna", "anna", WorkingFolder.Now, "Kim", null)
        {
            From = Today.PlusDays(-3),
            Via = Decision.ViaRow(Scope, "Anna Ahola", $"2026-06-12 {word}"),
        };
        Assert.Equal([expected], folder.Decisions());
        Assert.Equal(Today.PlusDays(-3), folder.Read((_, session) => Assert.Single(session.People.Behind(LocalDate.MinIsoValue)).DirtyFrom));
    }

    [Fact]
    public void TakingUpAgainChangesNothingAlsoWhenTheRowsWereReadAnew()
    {
        folder.PutRows(Row("anna", Today, Say(AnswerWord.Ill)), Row("squad", Today, Say(AnswerWord.Rest)));
        folder.TakeUp();
        var before = folder.Decisions();
        Assert.Equal(4, before.Count);

        Assert.Equal((0, 0), Counts(folder.TakeUp(Later)));
        folder.Write((_, session) =>
        {
            session.Derived.Empty();
            return true;
        });
        folder.PutRows(Row("anna", Today, Say(AnswerWord.Ill)), Row("squad", Today, Say(AnswerWord.Rest)));
        Assert.Equal((0, 0), Counts(folder.TakeUp(Later)));
        Assert.Equal(before, folder.Decisions());
    }

    [Fact]
    public void ARowThatGoesIsWithdrawnAndOneThatComesBackDecidesAnew()
    {
        folder.Sweep();
        var row = Row("anna", Today.PlusDays(-3), Say(AnswerWord.Ill));
        folder.PutRows(row);
        folder.Sweep();

        folder.PutRows();

        Assert.Equal((0, 1), Counts(folder.TakeUp()));
        Assert.Empty(folder.InForce());
        Assert.Equal([DecisionKind.Ill, DecisionKind.Withdraw], folder.Decisions().Select(decision => decision.Kind));
        Assert.Equal(Today.PlusDays(-3), folder.Read((_, session) => session.People.Behind(LocalDate.MinIsoValue)[0].DirtyFrom));
        folder.PutRows(row);
        Assert.Equal((1, 0), Counts(folder.TakeUp()));
        Assert.Equal(DecisionKind.Ill, Assert.Single(folder.InForce()).Kind);
        Assert.Equal((0, 0), Counts(folder.TakeUp(Later)));
    }

    [Fact]
    public void ATableThatIsLostTakesNothingBack()
    {
        folder.PutRows(Row("anna", Today, Say(AnswerWord.Ill)));
        folder.TakeUp();

        folder.Write((_, session) =>
        {
            session.TableRows.Remove(session.TableRows.OfScope(Scope));
            return true;
        });

        Assert.Equal((0, 0), Counts(folder.TakeUp(Later)));
        Assert.Single(folder.InForce());
    }

    [Theory]
    [InlineData("until")]
    [InlineData("note")]
    [InlineData("person")]
    public void ARowThatChangesIsWithdrawnAndMadeAnew(string what)
    {
        folder.PutRows(Row("7", Today, Say(AnswerWord.Ill), "anna"));
        folder.TakeUp();
        folder.PutRows(what switch
        {
            "until" => Row("7", Today, Say(AnswerWord.Ill, until: Today.PlusDays(2)), "anna", Later),
            "note" => Row("7", Today, Say(AnswerWord.Ill, note: "flu"), "anna", Later),
            _ => Row("7", Today, Say(AnswerWord.Ill), "bo", Later),
        });

        Assert.Equal((1, 1), Counts(folder.TakeUp(Later)));

        Assert.Equal(Later, Assert.Single(folder.InForce()).Made);
        Assert.Equal((0, 0), Counts(folder.TakeUp(Later)));
    }

    [Fact]
    public void AGroupsRowDecidesForThoseWhoAreInItThen()
    {
        folder.PutRows(Row("SQUAD", Today, Say(AnswerWord.Match)));
        folder.TakeUp();
        folder.Write("roster.csv", WorkingFolder.Roster.Replace("bo,", "dora,Dora Dahl,squad,,,\nbo,", StringComparison.Ordinal));

        Assert.Equal((0, 0), Counts(folder.TakeUp(Later)));
        Assert.Equal(["anna", "bo", "cara"], folder.InForce().Select(decision => decision.Person).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void ACommandIsNotWithdrawnByATable()
    {
        folder.Put("ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        folder.Assign(Some.Fit(Some.Yesterday), "anna");

        Assert.Equal((0, 0), Counts(folder.TakeUp(Later)));
        Assert.Single(folder.InForce());
    }

    [Theory]
    [InlineData("ana", AnswerWord.Ill, null, "\"ana\" is no person and no group of the roster; did you mean \"anna\"?")]
    [InlineData("", AnswerWord.Seen, null, "it names no person and no group")]
    [InlineData("anna", AnswerWord.Ill, -1, "its last date lies before its first")]
    [InlineData("anna", AnswerWord.Shelve, null, "shelve wants a last date (until)")]
    [InlineData("anna", AnswerWord.Shelve, 61, "shelved for more than 60 days")]
    [InlineData("anna", AnswerWord.BelongsTo, null, "\"ride.fit\" is no file known here")]
    [InlineData("squad", AnswerWord.BelongsTo, null, "a file belongs to one person, not to a group")]
    public void ARowThatNobodyCanFollowIsAQuestion(string subject, AnswerWord word, int? untilDays, string reason)
    {
        folder.PutRows(Row(subject, Today, Say(word, until: untilDays is { } days ? Today.PlusDays(days) : null, file: "ride.fit")));

        var question = Assert.Single(folder.TakeUp().Questions);

        Assert.Equal(
            ("answers.csv", $"the answer of 15 June{(subject.Length > 0 ? $" about {subject}" : "")} is not followed: {reason}"), (question.Subject, question.Sentence));
        Assert.Equal([question], folder.Read((workplace, session) => new Answers(workplace.Configuration, WorkingFolder.Now).Questions(session)));
        Assert.Empty(folder.Decisions());
    }

    [Fact]
    public void AFileThatComesLaterIsAssignedThen()
    {
        folder.Sweep();
        folder.PutRows(Row("anna", Today, Say(AnswerWord.BelongsTo, file: "ride.fit"), "anna"));
        Assert.Single(folder.TakeUp().Questions);
        folder.Put("ride.fit", Some.Fit(Some.Yesterday));

        var report = folder.Sweep();

        Assert.Empty(report.OpenAnswers);
        Assert.Equal("anna", folder.Arrival(Some.Fit(Some.Yesterday))!.Person);
        folder.Put("ride.fit", Some.Fit(Some.Yesterday, 30), Duration.FromMinutes(30));
        Assert.Empty(folder.Sweep().OpenAnswers); // A second content of that name: the row was followed.
        Assert.Single(folder.InForce());
    }

    [Fact]
    public void TwoFilesOfOneNameAreAQuestion()
    {
        folder.Put("ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        folder.Put("ride.fit", Some.Fit(Some.Yesterday, 30), Duration.FromMinutes(30));
        folder.PutRows(Row("anna", Today, Say(AnswerWord.BelongsTo, file: "ride.fit"), "anna"));

        Assert.Contains(" is not followed: \"ride.fit\" is more than one file; ", Assert.Single(folder.Sweep().OpenAnswers).Sentence, StringComparison.Ordinal);
    }

    /// <summary>Whose the ride is decides whether anna has been silent for four days.</summary>
    [Fact]
    public void AWrongOwnerIsPutRightByAnAnswerAndWrongAgainWithoutIt()
    {
        var ride = Some.Fit(Some.Yesterday.PlusDays(-1), 60);
        folder.Fill([.. Some.Fortnight(), ("cara/late.fit", ride)]);
        folder.Sweep();
        Assert.Contains("\"state\":\"unacknowledged\"", folder.Export("alerts"), StringComparison.Ordinal);
        var before = folder.Export("days");

        folder.PutRows(Row("anna", Today, Say(AnswerWord.BelongsTo, file: "cara/late.fit"), "anna"));
        var report = folder.Sweep();

        Assert.Equal((1, 2), (report.AnswersTaken, report.PeopleComputed));
        Assert.Equal("anna", folder.Arrival(ride)!.Person);
        Assert.Contains("\"state\":\"returned\"", folder.Export("alerts"), StringComparison.Ordinal);
        Assert.Equal(0, folder.Sweep().PeopleComputed);

        folder.PutRows();
        Assert.Equal(2, folder.Sweep(Later).PeopleComputed);
        Assert.Equal(("cara", before), (folder.Arrival(ride)!.Person, folder.Export("days")));
        Assert.Equal(0, folder.Sweep(Later).PeopleComputed);
    }

    private static (int Made, int Withdrawn) Counts(AnswersReport report) => (report.Made, report.Withdrawn);
}
