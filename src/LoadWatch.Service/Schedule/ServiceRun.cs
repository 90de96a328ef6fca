using LoadWatch.Service.Commands;
using LoadWatch.Service.Health;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Hosting.WindowsServices;

namespace LoadWatch.Service.Schedule;

/// <summary>Runs the host to its end. The host itself ends without an error when one of its services fails; this says so in the exit code.</summary>
public static class ServiceRun
{
    /// <returns>0 when it was told to stop; else the code of what ended it.</returns>
    public static async Task<int> ToTheEndAsync(IHost host, CancellationToken cancel)
    {
        var end = host.Services.GetRequiredService<ServiceEnd>();
        var lifetime = host.Services.GetRequiredService<IHostApplicationLifetime>();
        var services = host.Services.GetServices<IHostedService>().OfType<BackgroundService>().ToList();
        var manager = host.Services.GetRequiredService<IHostLifetime>();
        lifetime.ApplicationStopped.Register(() =>
        {
            if (services.Exists(service => service.ExecuteTask is { IsFaulted: true }))
            {
                end.Fail(ExitCode.Software);
            }

            TellWindows(manager, end.Code);
        });
        var stopping = lifetime.ApplicationStopping;
        try
        {
            await host.RunAsync(cancel);
        }
        catch (Exception e) when (stopping.IsCancellationRequested && IsCutOff(e))
        {
            // The stop took longer than allowed and was cut off; the next start goes on from the last commit (I-4).
        }

        return end.Code;
    }

    private static bool IsCutOff(Exception e) =>
        e is OperationCanceledException || (e is AggregateException several && several.InnerExceptions.All(IsCutOff));

    /// <summary>The Windows service manager restarts a service only where it reported a failure before it stopped.</summary>
    private static void TellWindows(IHostLifetime manager, int code)
    {
        if (OperatingSystem.IsWindows() && manager is WindowsServiceLifetime service)
        {
            service.ExitCode = code;
        }
    }
}
