using LoadWatch.Recordings;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Storage.Tests.Recordings;

public sealed class ArrivalTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void ANewArrivalWaits()
    {
        Assert.True(Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), Some.Sha(2), Some.Sha(3), 4)));

        Assert.Equal(
            new Arrival(Some.Sha(1), Some.Sha(2), Some.Sha(3), null, ArrivalState.Waiting, null, null, 0, 4),
            Store.Read(session => session.Arrivals.Get(Some.Sha(1))));
    }

    [Fact]
    public void EveryProblemOfAnArrivalIsKept()
    {
        Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 4));
        Assert.Empty(Store.Read(session => session.Arrivals.Problems(Some.Sha(1))));

        Store.Write(session => session.Arrivals.Settle(Some.Sha(1), ArrivalState.Stored, "csv", "line 2: \"x\"", "anna", ["line 2: \"x\"", "line 3"]));
        Assert.Equal(["line 2: \"x\"", "line 3"], Store.Read(session => session.Arrivals.Problems(Some.Sha(1))));

        Store.Write(session => session.Arrivals.Settle(Some.Sha(1), ArrivalState.Stored, "csv", null, "anna"));
        Assert.Empty(Store.Read(session => session.Arrivals.Problems(Some.Sha(1))));
        Assert.Empty(Store.Read(session => session.Arrivals.Problems(Some.Sha(2))));
    }

    [Fact]
    public void ASecondAddOfAKnownArrivalDoesNothing()
    {
        Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 4));
        Store.Write(session => session.Arrivals.Settle(Some.Sha(1), ArrivalState.Stored, "fit", null, "anna"));

        Assert.False(Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), Some.Sha(9), Some.Sha(9), 4)));

        Assert.Equal(
            new Arrival(Some.Sha(1), null, Some.Sha(1), "fit", ArrivalState.Stored, null, "anna", 0, 4),
            Assert.Single(Store.Read(session => session.Arrivals.All())));
    }

    [Fact]
    public void OnlyWaitingArrivalsAreWaitingAndInTheOrderOfTheirContent()
    {
        Store.Write(session =>
        {
            foreach (var number in (int[])[3, 1, 2])
            {
                session.Arrivals.AddWaiting(Some.Sha(number), null, Some.Sha(number), 4);
            }

            session.Arrivals.Settle(Some.Sha(2), ArrivalState.Refused, null, "byte 771: not a FIT header", null);
        });

        Assert.Equal([Some.Sha(1), Some.Sha(3)], Store.Read(session => session.Arrivals.Waiting()).Select(arrival => arrival.Sha));
        Assert.Equal([Some.Sha(2)], Store.Read(session => session.Arrivals.InState(ArrivalState.Refused)).Select(arrival => arrival.Sha));
        Assert.Empty(Store.Read(session => session.Arrivals.InState(ArrivalState.Held)));
        Assert.Equal([Some.Sha(1), Some.Sha(2), Some.Sha(3)], Store.Read(session => session.Arrivals.All()).Select(arrival => arrival.Sha));
    }

    [Fact]
    public void EveryStateIsCounted()
    {
        Store.Write(session =>
        {
            session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 4);
            session.Arrivals.AddWaiting(Some.Sha(2), null, Some.Sha(2), 4);
            session.Arrivals.Settle(Some.Sha(2), ArrivalState.Held, null, "nobody is named", null);
        });

        var counts = Store.Read(session => session.Arrivals.CountByState());

        Assert.Equal(5, counts.Count);
        Assert.Equal(1, counts[ArrivalState.Waiting]);
        Assert.Equal(1, counts[ArrivalState.Held]);
        Assert.Equal(0, counts[ArrivalState.Refused]);
    }

    [Fact]
    public void AttemptsAreCounted()
    {
        Store.Write(session =>
        {
            session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 4);
            session.Arrivals.CountAttempt(Some.Sha(1));
            session.Arrivals.CountAttempt(Some.Sha(1));
        });

        Assert.Equal(2, Store.Read(session => session.Arrivals.Get(Some.Sha(1))!.Attempts));
    }

    [Fact]
    public void WhatNeverCameCannotBeSettled() =>
        Assert.Throws<InvalidOperationException>(() =>
            Store.Write(session => session.Arrivals.Settle(Some.Sha(1), ArrivalState.Stored, "fit", null, "anna")));
}
