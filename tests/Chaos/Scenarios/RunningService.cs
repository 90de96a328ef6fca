using System.Globalization;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>A disk that fails under the running service, which nobody watches: it ends itself, or goes on by itself.</summary>
public static class RunningService
{
    private const int InputOutput = 74;

    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(300);
    private static readonly TimeSpan Look = TimeSpan.FromMilliseconds(200);

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("service-sync-fails", "D59", "A sync of the database fails once under the running service: it ends with 74, so that it is started anew.", SyncFails, Needs.Tracing),
        new("service-space-returns", "D57", "The disk is full for some writes under the running service, then not: it goes on without a restart.", SpaceReturns, Needs.Tracing),
    ];

    private static void SyncFails(Trial trial)
    {
        using var desk = MailDesk.Open(trial, take: "move");
        foreach (var number in trial.IsLong ? Enumerable.Range(1, 8) : [1, 3])
        {
            using var place = desk.Night();
            var ended = Traced(place, $"fsync:error=EIO:when={number.ToString(CultureInfo.InvariantCulture)}").WaitForEnd();
            Trial.MustBe(InputOutput, ended.Code, $"as the exit code after a failed sync ({ended.Said})");
            File.Delete(place.At("trace.txt"));
            desk.MustSendTheRest(place, furtherCopies: 1);
            trial.Survived();
        }
    }

    private static void SpaceReturns(Trial trial)
    {
        using var desk = MailDesk.Open(trial, take: "move");

        // Numbers count by thread, and every thread that a sweep runs on meets them once: some sweeps fail before one goes through.
        foreach (var numbers in trial.IsLong ? new[] { "1", "5..6", "20..22", "60" } : ["5"])
        {
            using var place = desk.Night();
            using var service = Traced(place, $"pwrite64:error=ENOSPC:when={numbers}");
            WaitUntilTaken(place, service);
            service.SignalTraced("TERM");
            Trial.MustBe(0, service.WaitForEnd().Code, "as the exit code of a service that was told to stop");
            File.Delete(place.At("trace.txt"));
            desk.MustSendTheRest(place, furtherCopies: 1);
            trial.Survived();
        }
    }

    /// <summary>The service under strace, which injects into calls on the write-ahead log alone.</summary>
    private static Child Traced(Place place, string injection) => place.StartUnder(
        [.. new Tracer(place.At("trace.txt")).Words(injection), "-P", place.DatabasePath + "-wal"], ["run"]);

    private static void WaitUntilTaken(Place place, Child service)
    {
        for (var waited = TimeSpan.Zero; Directory.EnumerateFiles(place.Inbox, "*", SearchOption.AllDirectories).Any(); waited += Look)
        {
            if (waited > Patience || service.EndsWithin(Look))
            {
                throw new ChaosFailureException("the service does not go on by itself");
            }
        }
    }
}
