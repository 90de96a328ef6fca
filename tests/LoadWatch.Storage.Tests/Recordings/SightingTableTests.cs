using LoadWatch.Storage.Files;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Storage.Tests.Recordings;

public sealed class SightingTableTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly FileStamp Stamp = new(1234, 1_772_350_200_250, "8.1:77");

    [Fact]
    public void ASightingIsReadAsItWasWritten()
    {
        Store.Write(session => session.Sightings.Upsert("watches", "anna/ride.fit", Some.Sha(1), Some.Moment, Stamp));

        Assert.Equal(
            new Sighting("watches", "anna/ride.fit", Some.Sha(1), Some.Moment, Stamp, Latest: true, Some.Moment),
            Assert.Single(Store.Read(session => session.Sightings.Of(Some.Sha(1)))));
        Assert.Equal((1, 0), Store.Read(session => (session.Sightings.CountLatest("watches"), session.Sightings.CountLatest("pods"))));
    }

    [Fact]
    public void ANewContentUnderAKnownNameIsTheLatest()
    {
        Store.Write(session => session.Sightings.Upsert("pods", "ratings.csv", Some.Sha(1), Some.Moment, Stamp));
        Store.Write(session => session.Sightings.Upsert("pods", "ratings.csv", Some.Sha(2), Some.Moment, Stamp));

        Assert.Equal(1, Store.Read(session => session.Sightings.CountLatest("pods")));
        Assert.True(Assert.Single(Store.Read(session => session.Sightings.Of(Some.Sha(2)))).Latest);
        Assert.False(Assert.Single(Store.Read(session => session.Sightings.Of(Some.Sha(1)))).Latest);
    }

    [Fact]
    public void AContentThatComesBackIsTheLatestAgainAndKeepsItsFirstMoment()
    {
        var later = Some.Moment + Duration.FromHours(1);
        var newStamp = Stamp with { ModifiedUnixMs = 5 };
        Store.Write(session =>
        {
            session.Sightings.Upsert("pods", "ratings.csv", Some.Sha(1), Some.Moment, Stamp);
            session.Sightings.Upsert("pods", "ratings.csv", Some.Sha(2), later, Stamp);
            session.Sightings.Upsert("pods", "ratings.csv", Some.Sha(1), later, newStamp);
        });

        Assert.Equal(
            new Sighting("pods", "ratings.csv", Some.Sha(1), Some.Moment, newStamp, Latest: true, later),
            Assert.Single(Store.Read(session => session.Sightings.Of(Some.Sha(1)))));
    }

    [Fact]
    public void NamesOfAContentAreSortedOrdinally()
    {
        Store.Write(session =>
        {
            session.Sightings.Upsert("b", "a.fit", Some.Sha(1), Some.Moment, Stamp);
            session.Sightings.Upsert("a", "outer.zip!/inner.fit", Some.Sha(1), Some.Moment, Stamp);
            session.Sightings.Upsert("a", "Z.fit", Some.Sha(1), Some.Moment, Stamp);
            session.Sightings.Upsert("a", "ä.fit", Some.Sha(1), Some.Moment, Stamp);
        });

        // Upper case before lower case before letters beyond ASCII: code points.
        Assert.Equal(
            ["a/Z.fit", "b/a.fit", "a/outer.zip!/inner.fit", "a/ä.fit"],
            Store.Read(session => session.Sightings.Of(Some.Sha(1))).Select(sighting => $"{sighting.Inbox}/{sighting.Path}"));
    }
}
