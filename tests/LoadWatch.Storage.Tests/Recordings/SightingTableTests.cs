using LoadWatch.Rows;
using LoadWatch.Storage.Files;
using LoadWatch.Storage.Recordings;
using LoadWatch.Storage.Rows;
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

    /// <summary>1: under two names; 2: within an archive that grows every night; 3: follows another content under its name, which brought some of it.</summary>
    [Fact]
    public void ARecordingWasSeenWithItsContentOrItsArchiveFirst()
    {
        var rated = new SessionRow(null, null, null, null, 60, 5, [], null);
        Instant At(int hours) => Some.Moment + Duration.FromHours(hours);
        Store.Write(session =>
        {
            foreach (var (number, within) in new[] { (1, 1), (2, 9), (3, 3) })
            {
                session.Arrivals.AddWaiting(Some.Sha(number), within == number ? null : Some.Sha(within), Some.Sha(within), 10);
                session.Recordings.Add(Some.Recording(number));
            }

            session.Sightings.Upsert("watches", "ride.fit", Some.Sha(1), At(5), Stamp);
            session.Sightings.Upsert("pods", "ride copy.fit", Some.Sha(1), At(3), Stamp);
            session.Sightings.Upsert("watches", "all.zip", Some.Sha(9), At(7), Stamp);
            session.Sightings.Upsert("watches", "all.zip", Some.Sha(8), At(31), Stamp);
            session.Sightings.Upsert("watches", "season.csv", Some.Sha(4), At(1), Stamp);
            session.Sightings.Upsert("watches", "season.csv", Some.Sha(3), At(40), Stamp);
            session.TableRows.Put([
                new("pods/sets.csv", RowKind.Sessions, "own", "anna", "anna", Some.Date, "1", At(50), rated),
                new("pods/sets.csv", RowKind.Sessions, "own", "anna", "anna", Some.Date, "2", At(26), rated)]);
        });

        Assert.Equal(
            [(null, At(3)), (null, At(7)), (Some.Date, At(26))],
            Store.Read(session => session.Sightings.FirstOfDates("anna", Some.Date)).OrderBy(one => one.Seen).Select(one => (one.Date, one.Seen)));
        Assert.Empty(Store.Read(session => session.Sightings.FirstOfDates("anna", Some.Date.PlusDays(1))));
        Assert.Empty(Store.Read(session => session.Sightings.FirstOfDates("bo", Some.Date)));
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
