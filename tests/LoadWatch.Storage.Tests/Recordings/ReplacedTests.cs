using LoadWatch.Recordings;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Storage.Tests.Recordings;

/// <summary>Which contents hold the names of a content now.</summary>
public sealed class ReplacedTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly FileStamp Stamp = new(4, 5, "6");

    [Fact]
    public void AContentThatHoldsAnyOfItsNamesIsNotReplaced()
    {
        See(1, "ride.fit", day: 1);
        See(1, "kept.fit", day: 1);
        See(2, "ride.fit", day: 2);

        Assert.Null(Replaced(1));
        Assert.Null(Replaced(2));
        Assert.Null(Replaced(3));
    }

    [Fact]
    public void AContentIsReplacedByWhatHoldsItsNames()
    {
        See(1, "a.fit", day: 1);
        See(1, "b.fit", day: 1);
        See(3, "a.fit", day: 2);
        See(2, "b.fit", day: 3);

        Assert.Equal([Some.Sha(2), Some.Sha(3)], Replaced(1));
        Assert.Equal([Some.Sha(2), Some.Sha(3)], Store.Read(session => session.Sightings.NameSakes(Some.Sha(1))).Order(StringComparer.Ordinal));
        Assert.Equal([Some.Sha(1)], Store.Read(session => session.Sightings.NameSakes(Some.Sha(2))));
    }

    [Fact]
    public void WhatIsNotStoredHoldsNoName()
    {
        See(1, "ride.fit", day: 1);
        See(2, "ride.fit", day: 2, ArrivalState.Refused);

        Assert.Null(Replaced(1));
    }

    [Fact]
    public void BehindABrokenContentTheOneBeforeItHoldsTheName()
    {
        See(1, "ride.fit", day: 1);
        See(2, "ride.fit", day: 2);
        See(3, "ride.fit", day: 3, ArrivalState.Refused);

        Assert.Equal([Some.Sha(2)], Replaced(1));
        Assert.Null(Replaced(2));
    }

    [Fact]
    public void AContentThatComesBackHoldsItsNameAgain()
    {
        See(1, "ride.fit", day: 1);
        See(2, "ride.fit", day: 2);
        See(1, "ride.fit", day: 3);

        Assert.Null(Replaced(1));
        Assert.Equal([Some.Sha(1)], Replaced(2));
    }

    private void See(int number, string path, int day, ArrivalState state = ArrivalState.Stored) => Store.Write(session =>
    {
        session.Arrivals.AddWaiting(Some.Sha(number), null, Some.Sha(number), 4);
        session.Arrivals.Settle(Some.Sha(number), state, "fit", null, null);
        session.Sightings.Upsert("inbox", path, Some.Sha(number), Instant.FromUtc(2026, 3, day, 5, 0), Stamp);
    });

    private IReadOnlyList<string>? Replaced(int number) => Store.Read(session => session.Sightings.Replaced(Some.Sha(number)));
}
