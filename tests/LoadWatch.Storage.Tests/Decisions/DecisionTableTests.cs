using LoadWatch.Storage.Decisions;
using Microsoft.Data.Sqlite;
using NodaTime;

namespace LoadWatch.Storage.Tests.Decisions;

public sealed class DecisionTableTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly Decision Seen = new(DecisionKind.Acknowledge, Some.Alert().Id, "anna", Some.Moment, "Kim Köhler", "spoke to her; \"rest\" until Friday");

    [Fact]
    public void ADecisionIsReadAsItWasWritten()
    {
        var bare = Assigned(1, "bo", 1);
        Add(Seen, bare);

        Assert.Equal([Seen, bare], Store.Read(session => session.Decisions.All()));
        Assert.Equal([Seen], Store.Read(session => session.Decisions.OfAlert(Some.Alert().Id)));
        Assert.Empty(Store.Read(session => session.Decisions.OfAlert(Some.Alert("bo").Id)));
    }

    [Fact]
    public void AnIdIsMadeOfKindSubjectAndInstant()
    {
        Assert.Equal("acknowledge|anna|load_ratio||2026-03-01|2026-03-02T05:00:00.000000000Z", Seen.Id);
        Assert.Equal($"assign|{Some.Sha(1)}|2026-03-02T05:00:07.000000000Z", Assigned(1, "bo", 7).Id);
    }

    [Fact]
    public void TheLatestOfSeveralIsInForceWhateverTheOrderOfWriting()
    {
        Add(Assigned(1, "bo", 20), Assigned(2, "cara", 15), Assigned(1, "anna", 3), Seen);

        Assert.Equal(["anna", "bo"], Store.Read(session => session.Decisions.OfArrival(Some.Sha(1))).Select(decision => decision.Person));
        Assert.Empty(Store.Read(session => session.Decisions.OfArrival(Some.Sha(3))));
        var inForce = Store.Read(session => session.Decisions.Assigned());
        Assert.Equal([(Some.Sha(1), "bo"), (Some.Sha(2), "cara")], inForce.Select(pair => (pair.Key, pair.Value.Person)).Order());
        Assert.Equal(["anna", "anna", "cara", "bo"], Store.Read(session => session.Decisions.All()).Select(decision => decision.Person));
    }

    [Fact]
    public void TheSameDecisionAtTheSameMomentIsAnError()
    {
        Add(Seen);

        Assert.Throws<SqliteException>(() => Add(Seen with { By = "Alex" }));
        Assert.Equal([Seen], Store.Read(session => session.Decisions.All()));
    }

    [Fact]
    public void OfARangeOfDatesEveryAbsenceIsReadAndRestAndMatchesThatBeginInIt()
    {
        var withdrawn = Dated(DecisionKind.Rest, 3) with { From = Some.Date.PlusDays(1) };
        Add(
            Dated(DecisionKind.Ill, 0) with { From = Some.Date.PlusDays(-900) },
            Dated(DecisionKind.Rest, 1) with { From = Some.Date.PlusDays(-1) },
            Dated(DecisionKind.Match, 2) with { From = Some.Date },
            withdrawn,
            new Decision(DecisionKind.Withdraw, withdrawn.Id, "anna", Some.Moment + Duration.FromHours(1), null, null),
            Seen);

        Assert.Equal([DecisionKind.Ill, DecisionKind.Match], Store.Read(session => session.Decisions.OfDates("anna", Some.Date, Some.Date.PlusDays(2))).Select(decision => decision.Kind));
    }

    [Theory]
    [InlineData(DecisionKind.Ill)]
    [InlineData(DecisionKind.Injured)]
    [InlineData(DecisionKind.Away)]
    [InlineData(DecisionKind.Returning)]
    [InlineData(DecisionKind.Rest)]
    [InlineData(DecisionKind.Match)]
    public void ADecisionAboutDatesIsReadAsItWasWritten(DecisionKind kind)
    {
        var dated = Dated(kind, 0) with { Until = Some.Date.PlusDays(8), Via = "answers|inbox/answers.csv|Anna|2026-03-01" };
        Add(dated);

        Assert.Equal([dated], Store.Read(session => session.Decisions.OfPerson("anna")));
        Assert.EndsWith("|anna|2026-03-02T05:00:00.000000000Z|answers|inbox/answers.csv|Anna|2026-03-01", dated.Id, StringComparison.Ordinal);
        Assert.True(dated.IsAnswer);
    }

    [Fact]
    public void TwoRowsMayDecideTheSameAtOneMoment()
    {
        var (first, second) = (Dated(DecisionKind.Ill, 0) with { Via = Decision.ViaRow("inbox/a.csv", "Anna", "1") }, Dated(DecisionKind.Ill, 0) with { Via = Decision.ViaRow("inbox/a.csv", "squad", "1") });

        Add(second, first);

        Assert.Equal([first, second], Store.Read(session => session.Decisions.InForce("anna")));
    }

    [Fact]
    public void WhatWasWithdrawnIsInForceNowhere()
    {
        var shelved = Seen with { Kind = DecisionKind.Shelve, From = Some.Date, Until = Some.Date.PlusDays(5) };
        var (early, late, away) = (Assigned(1, "bo", 1), Assigned(1, "cara", 2), Dated(DecisionKind.Away, 3));
        Add(shelved, early, late, away, Withdrawn(late, 4), Withdrawn(shelved, 5), Withdrawn(away, 6));

        Assert.Equal([early], Store.Read(session => session.Decisions.InForce()));
        Assert.Equal(early, Store.Read(session => session.Decisions.Assigned())[Some.Sha(1)]);
        Assert.Empty(Store.Read(session => session.Decisions.AssignedNoMore()));
        Assert.Equal([shelved, Withdrawn(shelved, 5)], Store.Read(session => session.Decisions.OfAlert(shelved.Subject)));
        Assert.Equal([early, late, Withdrawn(late, 4)], Store.Read(session => session.Decisions.OfArrival(Some.Sha(1))));

        Add(Withdrawn(early, 7));

        Assert.Empty(Store.Read(session => session.Decisions.Assigned()));
        Assert.Equal(late, Assert.Single(Store.Read(session => session.Decisions.AssignedNoMore())).Value);
    }

    [Fact]
    public void OfOneMomentTheEarlierDateComesFirst()
    {
        var (later, earlier) = (Dated(DecisionKind.Ill, 0), Dated(DecisionKind.Injured, 0) with { From = Some.Date.PlusDays(-3) });
        Add(later, earlier);

        Assert.Equal([earlier, later], Store.Read(session => session.Decisions.All()));
    }

    private static Decision Dated(DecisionKind kind, int second) =>
        new(kind, "anna", "anna", Some.Moment + Duration.FromSeconds(second), "Kim", Note: null) { From = Some.Date };

    private static Decision Withdrawn(Decision decision, int second) =>
        new(DecisionKind.Withdraw, decision.Id, decision.Person, Some.Moment + Duration.FromSeconds(second), By: null, Note: null);

    private static Decision Assigned(int number, string person, int second) =>
        new(DecisionKind.Assign, Some.Sha(number), person, Some.Moment + Duration.FromSeconds(second), By: null, Note: null);

    private void Add(params Decision[] decisions) => Store.Write(session =>
    {
        foreach (var decision in decisions)
        {
            session.Decisions.Add(decision);
        }
    });
}
