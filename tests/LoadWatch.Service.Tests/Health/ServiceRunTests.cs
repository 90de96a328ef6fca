using LoadWatch.Service.Health;
using LoadWatch.Service.Schedule;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Tests.Health;

/// <summary>The host of .NET 10 ends without an error when a background service fails; a service manager would then not start it again.</summary>
public sealed class ServiceRunTests
{
    [Fact]
    public async Task AFailedServiceIsADefectInTheExitCode() => Assert.Equal(70, await Run(new Failing()));

    [Fact]
    public async Task AStopThatWasAskedForIsNoFailure() => Assert.Equal(0, await Run(new Stopping(_ => { })));

    [Fact]
    public async Task TheReasonOfAStopIsItsExitCode() => Assert.Equal(74, await Run(new Stopping(end => end.Fail(74))));

    [Fact]
    public async Task AServiceThatTakesTooLongToStopIsCutOffWithoutAFailure() => Assert.Equal(0, await Run(new Stopping(_ => { }), new Clinging()));

    [Fact]
    public async Task SoAreSeveral() => Assert.Equal(0, await Run(new Stopping(_ => { }), new Clinging(), new Clinging()));

    [Fact]
    public void TheFirstReasonStands()
    {
        var end = new ServiceEnd();
        end.Fail(74);
        end.Fail(70);
        Assert.Equal(74, end.Code);
    }

    private static async Task<int> Run(params Ending[] services)
    {
        var builder = Host.CreateEmptyApplicationBuilder(new HostApplicationBuilderSettings());
        builder.Services.AddSingleton<ServiceEnd>();
        builder.Services.Configure<HostOptions>(options => options.ShutdownTimeout = TimeSpan.FromMilliseconds(200));
        foreach (var service in services)
        {
            builder.Services.AddSingleton<IHostedService>(provider => service.In(provider));
        }

        using var host = builder.Build();
        return await ServiceRun.ToTheEndAsync(host, TestContext.Current.CancellationToken);
    }

    private abstract class Ending : BackgroundService
    {
        protected IServiceProvider Services { get; private set; } = null!;

        public Ending In(IServiceProvider services)
        {
            Services = services;
            return this;
        }
    }

    private sealed class Failing : Ending
    {
        protected override Task ExecuteAsync(CancellationToken stoppingToken) => throw new InvalidOperationException("a defect");
    }

    private sealed class Stopping(Action<ServiceEnd> before) : Ending
    {
        protected override Task ExecuteAsync(CancellationToken stoppingToken)
        {
            before(Services.GetRequiredService<ServiceEnd>());
            Services.GetRequiredService<IHostApplicationLifetime>().StopApplication();
            return Task.CompletedTask;
        }
    }

    /// <summary>Does not let go until the host gives up on it.</summary>
    private sealed class Clinging : Ending
    {
        protected override Task ExecuteAsync(CancellationToken stoppingToken) => Task.CompletedTask;

        public override Task StopAsync(CancellationToken cancellationToken) => Task.Delay(Timeout.Infinite, cancellationToken);
    }
}
