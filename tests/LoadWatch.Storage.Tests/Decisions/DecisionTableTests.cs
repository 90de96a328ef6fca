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
