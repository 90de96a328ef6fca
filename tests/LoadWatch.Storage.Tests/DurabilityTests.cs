using LoadWatch.Storage.Dialects;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage.Tests;

/// <summary>What may not be trusted: values before a commit, errors behind a first statement, a database whose file is gone.</summary>
public sealed class DurabilityTests : IDisposable
{
    private readonly TemporaryFolder temporary = new();
    private readonly DataFolder folder;

    public DurabilityTests() => folder = DataFolder.Open(temporary.At("data"));

    public void Dispose() => temporary.Dispose();

    /// <summary>The engine checks a deferred reference at the commit: then the work had its value already.</summary>
    [Fact]
    public void AValueOfATransactionWhoseCommitFailsIsNotGivenOut()
    {
        using var store = Store.Open(folder);
        var inside = 0;
        var outside = 0;

        Assert.Throws<SqliteException>(() => outside = store.Write(session =>
        {
            session.Execute("PRAGMA defer_foreign_keys=ON");
            session.Recordings.Add(Some.Recording(1));
            return inside = 1;
        }));

        Assert.Equal((1, 0), (inside, outside));
        Assert.Empty(store.Read(session => session.Recordings.All()));
    }

    [Fact]
    public void AnErrorBehindAFirstStatementIsNotSwallowed()
    {
        using var store = Store.Open(folder);

        Assert.Throws<SqliteException>(() => store.Write(session =>
        {
            session.Value<long>("SELECT 1");
            session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10);
            session.Execute("INSERT INTO arrival (sha, object_sha, state, attempts, size) VALUES (@sha, @sha, 'waiting', 0, 1)", new { sha = Some.Sha(1) });
        }));

        Assert.Empty(store.Read(session => session.Arrivals.All()));
    }

    /// <summary>The library that runs the scripts sends each statement alone: a fault of the second table is not lost behind the first.</summary>
    [Fact]
    public void AScriptWhoseLaterStatementFailsIsAnError()
    {
        using (var connection = new SqliteConnection($"Data Source={folder.DatabasePath};Pooling=False"))
        {
            connection.Open();
            foreach (var sql in new[] { $"PRAGMA application_id={SqliteDialect.ApplicationId}", "CREATE TABLE sighting (inbox TEXT)" })
            {
                using var command = connection.CreateCommand();
                command.CommandText = sql;
                command.ExecuteNonQuery();
            }
        }

        Assert.Contains("0001_truth", Assert.Throws<InvalidOperationException>(() => Store.Open(folder)).Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("")]
    [InlineData("-wal")]
    public void ADatabaseThatIsDeletedWhileItIsOpenTakesNothingMore(string file)
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows deletes no open file");
        using var store = Store.Open(folder);
        store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));
        File.Delete(folder.DatabasePath + file);

        Assert.Throws<DurabilityLostException>(() => store.Write(session => session.Arrivals.AddWaiting(Some.Sha(2), null, Some.Sha(2), 10)));
        Assert.Throws<DurabilityLostException>(() => store.Write(_ => { }));
        Assert.False(File.Exists(folder.DatabasePath + file), "a silent new file");
    }

    [Fact]
    public void ADatabaseThatIsReplacedWhileItIsOpenTakesNothingMore()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows replaces no open file");
        using var store = Store.Open(folder);
        store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));
        File.Copy(folder.DatabasePath, temporary.At("copy"));
        File.Move(temporary.At("copy"), folder.DatabasePath, overwrite: true);

        var lost = Assert.Throws<DurabilityLostException>(() => store.Write(session => session.Arrivals.AddWaiting(Some.Sha(2), null, Some.Sha(2), 10)));
        Assert.Contains("deleted or replaced", lost.Message, StringComparison.Ordinal);
    }

    /// <summary>What the engine does when a database is closed it tells nobody, a failed sync neither: so it does nothing then.</summary>
    [Fact]
    public void ClosingLeavesTheLogToWhoOpensNext()
    {
        using (var store = Store.Open(folder))
        {
            store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));
        }

        Assert.NotEqual(0, new FileInfo(folder.DatabasePath + "-wal").Length);
        using var next = Store.Open(folder);
        Assert.Single(next.Read(session => session.Arrivals.All()));
    }

    [Fact]
    public void ASettledDatabaseIsWholeByItself()
    {
        using (var store = Store.Open(folder))
        {
            store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));
            store.Read(session => session.Arrivals.All());
            store.Settle();
        }

        Assert.Equal([folder.DatabasePath], Directory.EnumerateFiles(folder.Root, "loadwatch.db*"));
        using var next = Store.Open(folder);
        Assert.Single(next.Read(session => session.Arrivals.All()));
    }

    [Fact]
    public void WhatIsWrittenBehindTheSettlingIsKeptToo()
    {
        using (var store = Store.Open(folder))
        {
            store.Settle();
            store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));
        }

        using var next = Store.Open(folder);
        Assert.Single(next.Read(session => session.Arrivals.All()));
    }

    [Fact]
    public void TheLogIsEmptiedWhenItHasGrown()
    {
        using var store = Store.Open(folder);
        var (log, largest) = (new FileInfo(folder.DatabasePath + "-wal"), 0L);
        for (var megabyte = 0; megabyte < 30; megabyte++)
        {
            store.Write(session => session.Audits.Add("taken_in", new string('x', 1024 * 1024), Some.Moment));
            log.Refresh();
            largest = Math.Max(largest, log.Length);
        }

        Assert.InRange(largest, Store.LogMayGrowBytes / 2, Store.LogMayGrowBytes);
    }

    /// <summary>The log then grows once more by as much before it is tried again; the commit stands.</summary>
    [Fact]
    public void AReaderThatIsInTheWayOfEmptyingTheLogHoldsUpNoCommit()
    {
        using var store = Store.Open(folder);
        store.Read(session =>
        {
            Assert.Empty(session.Audits.All());
            for (var megabyte = 0; megabyte < 14; megabyte++)
            {
                store.Write(writing => writing.Audits.Add("taken_in", new string('x', 1024 * 1024), Some.Moment));
            }

            return 0;
        });

        Assert.False(new FileInfo(folder.DatabasePath + "-wal").Length < Store.LogMayGrowBytes);
        Assert.True(store.Checkpoint());
        Assert.Equal(14, store.Read(session => session.Audits.All()).Count);
    }

    [Fact]
    public void AReaderMakesNoNewDatabase()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows deletes no open file");
        using var store = Store.Open(folder);
        File.Delete(folder.DatabasePath);

        Assert.Throws<SqliteException>(() => store.Read(session => session.Arrivals.All()));
        Assert.False(File.Exists(folder.DatabasePath));
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void AMissingDatabaseBesideOriginalsIsNotMadeAnew(bool isEmpty)
    {
        File.WriteAllText(Path.Combine(folder.ObjectFolder(Some.Sha(1)), Some.Sha(1)), "an original");
        if (isEmpty)
        {
            File.WriteAllText(folder.DatabasePath, "");
        }

        var refused = Assert.Throws<DatabaseRefusedException>(() => Store.Open(folder));

        Assert.Contains("from a backup", refused.Message, StringComparison.Ordinal);
        Assert.Equal(isEmpty, File.Exists(folder.DatabasePath));
    }

    [Fact]
    public void AHalfWrittenCopyIsNoOriginal()
    {
        File.WriteAllText(Path.Combine(folder.IncomingPath, "1-1.part"), "half");

        using var store = Store.Open(folder);

        Assert.Empty(store.Read(session => session.Arrivals.All()));
    }

    [Fact]
    public void LookingOnlyMakesNothingAndWritesNothing()
    {
        Assert.Throws<DatabaseRefusedException>(() => Store.OpenToRead(folder));
        Assert.False(File.Exists(folder.DatabasePath));
        Store.Open(folder).Dispose();

        using var store = Store.OpenToRead(folder);

        Assert.Empty(store.Read(session => session.Arrivals.All()));
        Assert.Throws<InvalidOperationException>(() => store.Write(_ => { }));
    }

    [Fact]
    public void LookingOnlyRefusesAnotherSchema()
    {
        Store.Open(folder).Dispose();
        using (var connection = new SqliteConnection($"Data Source={folder.DatabasePath};Pooling=False"))
        {
            connection.Open();
            using var command = connection.CreateCommand();
            command.CommandText = "PRAGMA user_version=1";
            command.ExecuteNonQuery();
        }

        Assert.Contains("schema 1", Assert.Throws<DatabaseRefusedException>(() => Store.OpenToRead(folder)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void AZeroedPageIsFoundByTheCheck()
    {
        using (var store = Store.Open(folder))
        {
            store.Write(session => Enumerable.Range(1, 500).ToList().ForEach(i => session.Arrivals.AddWaiting(Some.Sha(i), null, Some.Sha(i), 10)));
            store.Settle();
        }

        using (var file = new FileStream(folder.DatabasePath, FileMode.Open))
        {
            file.Position = file.Length - 8192;
            file.Write(new byte[4096]);
        }

        using var damaged = Store.OpenToRead(folder);
        Assert.NotEmpty(damaged.Check());
    }

    [Fact]
    public void ACopyIsADatabaseOfItsOwn()
    {
        using var store = Store.Open(folder);
        store.Write(session => session.Arrivals.AddWaiting(Some.Sha(1), null, Some.Sha(1), 10));
        var other = DataFolder.Open(temporary.At("other"));
        store.CopyTo(other);

        using var copy = Store.Open(other);
        copy.Write(session => session.Arrivals.AddWaiting(Some.Sha(2), null, Some.Sha(2), 10));

        Assert.Equal((1, 2), (store.Read(session => session.Arrivals.All()).Count, copy.Read(session => session.Arrivals.All()).Count));
    }
}
