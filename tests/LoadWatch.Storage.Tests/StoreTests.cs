using LoadWatch.Storage.Dialects;
using LoadWatch.Storage.Recordings;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage.Tests;

public sealed class StoreTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void AnExceptionTakesBackEverythingOfItsTransaction()
    {
        var thrown = Assert.Throws<InvalidOperationException>(() => Store.Write(session =>
        {
            session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10);
            session.Audits.Add("taken_in", "one", Some.Moment);
            throw new InvalidOperationException("half way");
        }));

        Assert.Equal("half way", thrown.Message);
        Assert.Empty(Store.Read(session => session.Arrivals.All()));
        Assert.Empty(Store.Read(session => session.Audits.All()));
    }

    [Fact]
    public void RowsReadAreCounted()
    {
        Store.Write(session => Enumerable.Range(1, 3).ToList().ForEach(number => session.Arrivals.AddWaiting(Some.Sha(number), null, Some.Sha(number), 10)));
        var before = Store.RowsRead;

        Store.Read(session => session.Arrivals.All());

        Assert.Equal(3, Store.RowsRead - before);
    }

    [Fact]
    public void WorkGoesOnAfterAnExceptionInATransaction()
    {
        Assert.Throws<InvalidOperationException>(() => Store.Write(_ => throw new InvalidOperationException("half way")));

        Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));

        Assert.Single(Store.Read(session => session.Arrivals.All()));
    }

    [Fact]
    public void AnErrorOfTheDatabaseTakesBackEverythingOfItsTransaction()
    {
        Assert.Throws<SqliteException>(() => Store.Write(session =>
        {
            session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10);
            session.Recordings.Add(Some.Recording(1));
            session.Recordings.Add(Some.Recording(1));
        }));

        Assert.Empty(Store.Read(session => session.Arrivals.All()));
        Assert.Empty(Store.Read(session => session.Recordings.All()));
    }

    [Fact]
    public void ARecordingOfNoArrivalIsAnError() =>
        Assert.Throws<SqliteException>(() => Store.Write(session => session.Recordings.Add(Some.Recording(1))));

    [Fact]
    public void AReaderCannotWrite() =>
        Assert.Throws<SqliteException>(() => Store.Read(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10)));

    [Fact]
    public void AReaderSeesOneStateWhileAnotherWrites()
    {
        var counts = Store.Read(session =>
        {
            var before = session.Arrivals.All().Count;
            Store.Write(writing => writing.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));
            return (before, session.Arrivals.All().Count);
        });

        Assert.Equal((0, 0), counts);
        Assert.Single(Store.Read(session => session.Arrivals.All()));
    }

    [Fact]
    public void WhatWasWrittenIsThereAfterOpeningAgain()
    {
        Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));
        Store.Dispose();

        using var again = Store.Open(Folder);

        Assert.Equal(Some.Sha(1), Assert.Single(again.Read(session => session.Arrivals.All())).Sha);
    }

    [Fact]
    public void NothingIsWrittenAfterTheDiskFailedToSync()
    {
        // 1034 is SQLITE_IOERR_FSYNC (sqlite.org, result codes).
        Assert.Throws<DurabilityLostException>(() => Store.Write(_ => throw new SqliteException("disk I/O error", 10, 1034)));

        Assert.Throws<DurabilityLostException>(() =>
            Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10)));
        Assert.Empty(Store.Read(session => session.Arrivals.All()));
    }

    [Fact]
    public void AFullDiskDoesNotEndWritingForGood()
    {
        // 13 is SQLITE_FULL: it passes once there is room again.
        Assert.Throws<SqliteException>(() => Store.Write(_ => throw new SqliteException("database or disk is full", 13, 13)));

        Store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));

        Assert.Single(Store.Read(session => session.Arrivals.All()));
    }

    [Fact]
    public void ErasedTextIsNowhereInTheFiles()
    {
        const string secret = "a reason that nobody may read any more";
        Store.Write(session =>
        {
            session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10);
            session.Recordings.Add(Some.Recording(1) with { Source = secret });
        });
        Assert.Contains(secret, DatabaseBytes(), StringComparison.Ordinal);

        Store.Write(session => session.Recordings.RemoveArrival(Some.Sha(1)));

        Assert.True(Store.Checkpoint());
        Assert.DoesNotContain(secret, DatabaseBytes(), StringComparison.Ordinal);
    }

    [Fact]
    public void ASoundDatabaseHasNoComplaints() => Assert.Empty(Store.Check());

    [Fact]
    public void DatabaseFilesArePrivate()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows has access lists, no modes");
        Store.Write(session => session.Audits.Add("taken_in", "one", Some.Moment));

        var files = Directory.GetFiles(Folder.Root, "loadwatch.db*");

        Assert.Contains(Folder.DatabasePath + "-wal", files);
        Assert.All(files, file => Assert.Equal(UnixFileMode.UserRead | UnixFileMode.UserWrite, File.GetUnixFileMode(file)));
    }

    private string DatabaseBytes()
    {
        var text = "";
        foreach (var file in Directory.GetFiles(Folder.Root, "loadwatch.db*").Where(file => !file.EndsWith("-shm", StringComparison.Ordinal)))
        {
            using var stream = new FileStream(file, FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
            using var reader = new StreamReader(stream, System.Text.Encoding.Latin1);
            text += reader.ReadToEnd();
        }

        return text;
    }
}
