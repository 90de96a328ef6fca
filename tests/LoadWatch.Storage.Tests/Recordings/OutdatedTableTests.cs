using LoadWatch.Recordings;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Storage.Tests.Recordings;

public sealed class OutdatedTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void EverythingSettledIsMarkedOnceButWhatEndsItsProcess()
    {
        Settle(1, ArrivalState.Stored, "fit", "bo");
        Settle(2, ArrivalState.Refused, "fit", null);
        Settle(3, ArrivalState.Refused, "fit", null, attempts: 3);
        Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(4), null, Some.Sha(4), 1));

        Mark(session => session.Outdated.AddAll());
        Mark(session => session.Outdated.AddAll());

        Assert.Equal([new("", Some.Sha(2)), new("bo", Some.Sha(1))], Next());
        Assert.Equal((2, 1), Store.Read(session => (session.Outdated.Count(), session.Outdated.People())));
    }

    [Fact]
    public void OriginalsComePersonByPersonAndAnArchiveFileWithItsMembers()
    {
        Settle(5, ArrivalState.Aside, "zip", null);
        Settle(6, ArrivalState.Stored, "fit", "cara", within: 5);
        Settle(7, ArrivalState.Stored, "fit", "cara", within: 5);
        Settle(8, ArrivalState.Stored, "fit", "anna");
        Mark(session => session.Outdated.AddAll());

        Assert.Equal([new("anna", Some.Sha(8)), new("cara", Some.Sha(5))], Next());
        Assert.Equal([new("cara", Some.Sha(5))], Next(new OutdatedObject("anna", Some.Sha(8))));
        Assert.Equal([Some.Sha(5), Some.Sha(6), Some.Sha(7)], Of("cara", 5));

        Mark(session => session.Outdated.Done([Some.Sha(5), Some.Sha(7)]));
        Assert.Equal([Some.Sha(6)], Of("cara", 5));
        Assert.Equal(2, Store.Read(session => session.Outdated.Objects()));
    }

    [Fact]
    public void TextIsWhateverIsNeitherFitNorAnArchiveFile()
    {
        string?[] kinds = ["fit", "zip", "gzip", "csv", "table", "unknown", null];
        foreach (var (kind, number) in kinds.Select((kind, number) => (kind, number)))
        {
            Settle(number, ArrivalState.Aside, kind, null);
        }

        Mark(session => session.Outdated.AddText());
        Assert.Equal([Some.Sha(3), Some.Sha(4), Some.Sha(5), Some.Sha(6)], Next().Select(next => next.ObjectSha));
    }

    [Fact]
    public void RecordingsAreMarkedByTheirStart()
    {
        Settle(1, ArrivalState.Stored, "fit", "anna");
        Store.Write(session => session.Recordings.Add(Some.Recording(1)));
        var start = Some.Recording(1).Start;

        Mark(session => session.Outdated.AddRecordings("anna", start + Duration.FromSeconds(1), Instant.FromUtc(9999, 1, 1, 0, 0)));
        Mark(session => session.Outdated.AddRecordings("anna", Instant.FromUnixTimeTicks(0), start));
        Mark(session => session.Outdated.AddRecordings("bo", Instant.FromUnixTimeTicks(0), Instant.FromUtc(9999, 1, 1, 0, 0)));
        Assert.Empty(Next());

        Mark(session => session.Outdated.AddRecordings("anna", start, start + Duration.FromSeconds(1)));
        Assert.Equal([new("anna", Some.Sha(1))], Next());
    }

    private IReadOnlyList<OutdatedObject> Next(OutdatedObject? after = null) => Store.Read(session => session.Outdated.Next(after, 100));

    private IReadOnlyList<string> Of(string person, int number) => Store.Read(session => session.Outdated.Of(new OutdatedObject(person, Some.Sha(number))));

    private void Mark(Action<StoreSession> mark) => Store.Write(mark);

    private void Settle(int number, ArrivalState state, string? kind, string? person, int attempts = 0, int? within = null) => Store.Write(session =>
    {
        var parent = within is { } outer ? Some.Sha(outer) : null;
        session.Arrivals.AddWaiting(Some.Sha(number), parent, parent ?? Some.Sha(number), 1);
        for (var attempt = 0; attempt < attempts; attempt++)
        {
            session.Arrivals.CountAttempt(Some.Sha(number));
        }

        session.Arrivals.Settle(Some.Sha(number), state, kind, null, person);
    });
}
