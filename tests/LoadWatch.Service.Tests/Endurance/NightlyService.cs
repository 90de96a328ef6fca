using LoadWatch.Service.Commands;
using LoadWatch.Service.Schedule;
using LoadWatch.Service.Tests.Pipeline;
using Microsoft.Extensions.DependencyInjection;

namespace LoadWatch.Service.Tests.Endurance;

/// <summary>
/// The job of the service, night after night in one process over one open store, as <c>run</c> does it: configuration read anew, sweep, log, status file. Only the
/// clock is moved by hand. Looks every ten nights at what the process holds.
/// </summary>
public sealed class NightlyService : IDisposable
{
    /// <summary>The nights before the last year are for caches, pools and compiled code to come to their size.</summary>
    private static readonly int FirstSample = Season.Nights - 365;

    private const int BetweenSamples = 10;

    public NightlyService()
    {
        Folder = Season.Folder();
        var terminal = Console.Out;
        Console.SetOut(TextWriter.Null);
        try
        {
            Run();
        }
        finally
        {
            Console.SetOut(terminal);
        }
    }

    public IReadOnlyList<Holding> Samples { get; private set; } = [];

    public long LargestWalBytes { get; private set; }

    /// <summary>What the service logged, JSON lines.</summary>
    public string Log { get; private set; } = "";

    /// <summary>The working folder after the last night.</summary>
    internal WorkingFolder Folder { get; }

    public void Dispose() => Folder.Dispose();

    private void Run()
    {
        var files = Season.ByNight();
        var samples = new List<Holding>();
        var clock = new HandClock();
        using (var workplace = Workplace.OpenToWork(Folder.ConfigPath))
        using (var host = ServiceHost.Build(workplace, Folder.ConfigPath, clock))
        {
            var job = ActivatorUtilities.CreateInstance<SweepJob>(host.Services);
            for (var night = 0; night < Season.Nights; night++)
            {
                Folder.Fill(files[night]);
                clock.Now = Season.Morning(night).ToDateTimeOffset();
                var done = job.Execute(null!, CancellationToken.None).AsTask();
                Assert.True(done.IsCompletedSuccessfully, $"night {night} failed");
                LargestWalBytes = Math.Max(LargestWalBytes, new FileInfo(Path.Combine(Folder.Data, "loadwatch.db-wal")).Length);
                if (night >= FirstSample && night % BetweenSamples == 0)
                {
                    samples.Add(Holding.Now(night));
                }
            }
        }

        Samples = samples;
        Log = string.Concat(WorkingFolder.Files(Path.Combine(Folder.Data, "log")).Select(File.ReadAllText));
    }

    private sealed class HandClock : TimeProvider
    {
        public DateTimeOffset Now { get; set; } = Season.Morning(0).ToDateTimeOffset();

        public override DateTimeOffset GetUtcNow() => Now;
    }
}

/// <summary>The nights measure the process, so nothing else runs beside them.</summary>
[CollectionDefinition(Name, DisableParallelization = true)]
public sealed class Nightly : ICollectionFixture<NightlyService>
{
    public const string Name = "nights of a service";
}
