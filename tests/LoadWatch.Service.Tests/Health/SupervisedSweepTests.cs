using LoadWatch.Service.Commands;
using LoadWatch.Service.Health;
using LoadWatch.Service.Schedule;
using LoadWatch.Service.Tests.Pipeline;
using Microsoft.Data.Sqlite;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Tests.Health;

/// <summary>What the service does about a sweep that does not end well.</summary>
public sealed class SupervisedSweepTests : IDisposable, IHostApplicationLifetime, ILogger<SupervisedSweep>
{
    private readonly WorkingFolder folder = new();
    private readonly HandClock clock = new();
    private readonly Workplace workplace;
    private readonly ServiceRecord known;
    private readonly ServiceEnd end = new();
    private readonly List<int> logged = [];
    private readonly CancellationTokenSource stopping = new();
    private readonly SupervisedSweep sweep;

    public SupervisedSweepTests()
    {
        workplace = Workplace.OpenToWork(folder.ConfigPath);
        known = new ServiceRecord(WorkingFolder.Now);
        sweep = new SupervisedSweep(
            workplace, new ConfigurationFile(folder.ConfigPath), clock, new Statuses(workplace, known), known, new ClockGuard(workplace.Store), new SweepHeartbeat(clock, TimeSpan.FromSeconds(60)), end, this, this);
    }

    CancellationToken IHostApplicationLifetime.ApplicationStarted => CancellationToken.None;

    CancellationToken IHostApplicationLifetime.ApplicationStopping => stopping.Token;

    CancellationToken IHostApplicationLifetime.ApplicationStopped => CancellationToken.None;

    private ServiceStatus Status => StatusFile.Read(folder.Data)!;

    public void Dispose()
    {
        workplace.Dispose();
        stopping.Dispose();
        folder.Dispose();
    }

    [Fact]
    public void ASweepThatEndsWellIsInTheStatus()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Put("nobody.fit", Some.Fit(Some.Yesterday, 5));

        Assert.True(Run());

        Assert.Equal(("done", "2026-06-15T06:00:00Z", "2026-06-15T06:00:00Z"), (Status.Sweep!.Result, Status.LastDone, Status.LastArrival));
        Assert.Equal((0, 1, 0), (Status.Waiting, Status.Held, Status.DeliveriesWaiting));
        var inbox = Assert.Single(Status.Inboxes);
        Assert.Equal(("inbox", 2, null), (inbox.Name, inbox.Files, inbox.Away));
        Assert.NotNull(inbox.Folder);
        Assert.True(Status is { DatabaseBytes: > 0, WalBytes: > 0, DiskFreeBytes: > 0, LastCommit: not null, Schema: > 0 });
        Assert.DoesNotContain(Status.Troubles, trouble => trouble.Critical);
    }

    /// <summary>The trigger stands in for a disk that refuses: full, then with room again.</summary>
    [Fact]
    public void AFailureThatMayPassIsLoggedOnceAndEndsByItself()
    {
        Refuse("the disk");
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));

        Assert.False(Run());
        clock.Pass(60);
        Assert.False(Run());

        Assert.Equal([9901], logged);
        Assert.Equal((0, false), (end.Code, stopping.IsCancellationRequested));
        Assert.Equal("failed", Status.Sweep!.Result);
        Assert.Equal(("sweeps-fail", false), (Status.Troubles[0].Name, Status.Troubles[0].Critical));
        clock.Pass(600);
        Assert.False(Run());
        Assert.True(Status.Troubles[0].Critical);

        Run("DROP TRIGGER refuse");
        Assert.True(Run());
        Assert.Equal([9901, 9003, 1001], logged);
        Assert.Equal("done", Status.Sweep!.Result);
        Assert.DoesNotContain(Status.Troubles, trouble => trouble.Name == "sweeps-fail");
    }

    [Fact]
    public void ALostDatabaseEndsTheServiceToBeStartedAnew()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows deletes no open file");
        Assert.True(Run());
        File.Delete(Path.Combine(folder.Data, "loadwatch.db"));
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));

        Run();

        Assert.Equal((74, true), (end.Code, stopping.IsCancellationRequested));
        Assert.Contains(9902, logged);
    }

    [Fact]
    public void ADamagedDatabaseEndsTheServiceForGood()
    {
        Run("PRAGMA writable_schema=ON", "UPDATE sqlite_master SET rootpage = 999999 WHERE name = 'arrival'", "PRAGMA schema_version=99999");

        Run();

        Assert.Equal((65, true), (end.Code, stopping.IsCancellationRequested));
        Assert.Contains(9904, logged);
    }

    [Fact]
    public void NothingIsDoneUntilAClockThatIsBehindIsRight()
    {
        Assert.True(Run());
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        clock.Set(TimeSpan.FromDays(-20000));
        logged.Clear();

        Run();
        clock.Pass(300);
        Run();

        Assert.Equal([9103], logged);
        Assert.Empty(folder.Arrivals());
        Assert.Equal(("clock-behind", false), (Status.Troubles[0].Name, Status.Troubles[0].Critical));
        clock.Pass(300);
        Run();
        Assert.True(Status.Troubles[0].Critical);

        clock.Set(TimeSpan.FromDays(20000));
        Run();
        Assert.Single(folder.Arrivals());
        Assert.DoesNotContain(Status.Troubles, trouble => trouble.Name == "clock-behind");
    }

    [Fact]
    public void AnInboxThatGoesAwayAndComesBackIsLoggedOnceEach()
    {
        Run();
        logged.Clear();
        Directory.Move(folder.Inbox, folder.Inbox + " away");
        Run();
        Run();
        Assert.Equal([1901], logged);
        Assert.Equal(("inbox-inbox", false), (Status.Troubles[0].Name, Status.Troubles[0].Critical));
        clock.Pass(600);
        Run();
        Assert.Equal(("inbox-inbox", true), (Status.Troubles[0].Name, Status.Troubles[0].Critical));
        Directory.Move(folder.Inbox + " away", folder.Inbox);
        Run();
        Assert.Equal([1901, 1903], logged);
    }

    void IHostApplicationLifetime.StopApplication() => stopping.Cancel();

    IDisposable? ILogger.BeginScope<TState>(TState state) => null;

    bool ILogger.IsEnabled(LogLevel logLevel) => true;

    void ILogger.Log<TState>(LogLevel logLevel, EventId eventId, TState state, Exception? exception, Func<TState, Exception?, string> formatter) =>
        logged.Add(eventId.Id);

    private bool Run() => sweep.Run(TestContext.Current.CancellationToken);

    private void Refuse(string why) => Run($"CREATE TRIGGER refuse BEFORE INSERT ON arrival BEGIN SELECT RAISE(ABORT, '{why}'); END");

    private void Run(params string[] statements)
    {
        using var connection = new SqliteConnection($"Data Source={Path.Combine(folder.Data, "loadwatch.db")};Pooling=False");
        connection.Open();
        foreach (var sql in statements)
        {
            using var command = connection.CreateCommand();
            command.CommandText = sql;
            command.ExecuteNonQuery();
        }
    }
}
