using System.Diagnostics;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>The service as a process: it finds what is dropped into the inbox and ends when it is told to.</summary>
public sealed class RunTests : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(60);
    private static readonly TimeSpan Look = TimeSpan.FromMilliseconds(50);

    private readonly WorkingFolder folder = new(intake: "\"scan_seconds\": 5");

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AFileDroppedLaterIsTakenInAndASignalEndsTheServiceWith0()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "there is no SIGTERM on Windows");
        var page = Path.Combine(folder.Root, "pages", "staff.html");
        using var service = Loadwatch.Start(["run", "--config", folder.ConfigPath]);
        Await(service, () => File.Exists(page));
        var before = File.ReadAllText(page);
        Assert.Empty(folder.Export("arrivals"));
        folder.Put("anna/ride.fit", Some.Fit(new LocalDate(2025, 6, 14)));
        Await(service, () => folder.Export("activities").Contains("anna/ride.fit", StringComparison.Ordinal));
        Await(service, () => File.ReadAllText(page) != before);
        using (var signal = Process.Start("kill", ["-TERM", service.Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]))
        {
            signal.WaitForExit();
        }

        Assert.True(service.EndsWithin(TimeSpan.FromSeconds(20)), "the service has not ended");
        var ended = service.WaitForEnd();
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        Assert.DoesNotContain("Anna", ended.Output, StringComparison.Ordinal);
        Assert.Equal("", folder.LockHolder());
    }

    private static void Await(Loadwatch service, Func<bool> done)
    {
        var watch = Stopwatch.StartNew();
        while (!done())
        {
            Assert.False(service.EndsWithin(Look), "the service has ended");
            Assert.True(watch.Elapsed < Patience, "the service has not done it");
        }
    }
}
