using NodaTime;

namespace LoadWatch.Storage.Tests.Recordings;

public sealed class RecordingTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void ARecordingIsReadAsItWasWritten()
    {
        AddRecording(1);

        Assert.Equal(Some.Recording(1), Assert.Single(Store.Read(session => session.Recordings.OfPerson("anna"))));
        Assert.Equal(Some.Recording(1), Assert.Single(Store.Read(session => session.Recordings.All())));
        Assert.Equal(Some.Recording(1), Assert.Single(Store.Read(session => session.Recordings.OfArrival(Some.Sha(1)))));
        Assert.Empty(Store.Read(session => session.Recordings.OfPerson("Anna")));
    }

    [Fact]
    public void RecordingsAreSortedByTheirStartNotByTheTextOfIt()
    {
        // As ISO text without trailing zeros, "07:30:00Z" would sort behind "07:30:00.5Z".
        var start = Instant.FromUtc(2026, 3, 1, 7, 30);
        Store.Write(session =>
        {
            session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 4);
            session.Recordings.Add(Some.Recording(1) with { Part = 1, Start = start + Duration.FromMilliseconds(500) });
            session.Recordings.Add(Some.Recording(1) with { Part = 2, Start = start });
            session.Recordings.Add(Some.Recording(1) with { Part = 3, Start = start + Duration.FromNanoseconds(1) });
        });

        Assert.Equal([2, 3, 1], Store.Read(session => session.Recordings.OfPerson("anna")).Select(recording => recording.Part));
    }

    [Fact]
    public void RecordingsAreFoundByTheirStartBothEndsIncluded()
    {
        AddRecording(1);
        AddRecording(2);
        AddRecording(3);

        IEnumerable<int> Starting(int from, int to) => Store.Read(session => session.Recordings.Starting("anna", Some.Recording(from).Start, Some.Recording(to).Start))
            .Select(recording => Enumerable.Range(1, 3).Single(number => Some.Recording(number).Key == recording.Key));

        Assert.Equal([1, 2], Starting(1, 2));
        Assert.Equal([3], Starting(3, 9));
        Assert.Empty(Store.Read(session => session.Recordings.Starting("bo", Some.Recording(1).Start, Some.Recording(3).Start)));
    }

    [Fact]
    public void RemovingAnArrivalsRecordingsTakesTheActivitiesThatTheyHadWon()
    {
        AddRecording(1);
        AddRecording(2);
        Store.Write(session =>
        {
            session.Activities.Put(Some.Activity(1));
            session.Activities.Put(Some.Activity(2));
        });

        Store.Write(session => session.Recordings.RemoveArrival(Some.Sha(1)));

        Assert.Equal(Some.Recording(2), Assert.Single(Store.Read(session => session.Recordings.All())));
        Assert.Equal(Some.Recording(2).Key, Assert.Single(Store.Read(session => session.Activities.All())).Key);
    }
}
