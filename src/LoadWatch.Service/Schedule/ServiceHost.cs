using System.Runtime.Versioning;
using LoadWatch.People;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Health;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Hosting.Systemd;
using Microsoft.Extensions.Logging;
using Microsoft.Extensions.Logging.EventLog;
using NodaTime;
using Quartz;
using Serilog;

namespace LoadWatch.Service.Schedule;

/// <summary>Assembles the process that runs every night.</summary>
public static class ServiceHost
{
    /// <summary>A sweep is told to stop and comes to its next commit in this time; service managers must wait longer.</summary>
    public static readonly TimeSpan StopsWithin = TimeSpan.FromSeconds(20);

    private const string WindowsName = "LoadWatch";

    internal static readonly JobKey SweepKey = new("sweep");

    /// <summary>Quartz in memory: schedules come from the configuration, and what was missed is caught up from our own tables (I-7).</summary>
    public static IHost Build(Workplace workplace, string configPath)
    {
        var builder = Host.CreateApplicationBuilder(new HostApplicationBuilderSettings { ContentRootPath = AppContext.BaseDirectory });
        builder.Logging.ClearProviders();
        AddServiceManagers(builder.Services);
        builder.Services.AddSerilog(logger => ServiceLog.Configure(logger, workplace.Folder.Root, toConsole: true), writeToProviders: true);
        builder.Services.Configure<HostOptions>(options => options.ShutdownTimeout = StopsWithin);
        builder.Services.AddSingleton(TimeProvider.System);
        builder.Services.AddSingleton<ServiceEnd>();
        AddHeartbeats(builder.Services, workplace.Configuration.ScanEvery.ToTimeSpan());
        builder.Services.AddSingleton(new ServiceRecord(MachineClock.Now()));
        builder.Services.AddSingleton(new ClockGuard(workplace.Store));
        builder.Services.AddSingleton(workplace);
        builder.Services.AddSingleton(new ConfigurationFile(configPath));
        builder.Services.AddSingleton<Statuses>();
        builder.Services.AddSingleton<SupervisedSweep>();
        builder.Services.AddQuartz(quartz => Schedule(quartz, workplace));
        builder.Services.AddQuartzHostedService(options => options.WaitForJobsToComplete = true);
        builder.Services.AddHostedService<InboxWatcher>();
        builder.Services.AddHostedService<StatusTimer>();
        return builder.Build();
    }

    /// <summary>Each is without effect where another or none started this process. The watchdog comes first, so it is the last to stop.</summary>
    private static void AddServiceManagers(IServiceCollection services)
    {
        services.AddSystemd();
        if (SystemdHelpers.IsSystemdService())
        {
            services.AddHostedService<Watchdog>();
        }

        services.AddWindowsService(options => options.ServiceName = WindowsName);
        if (OperatingSystem.IsWindows())
        {
            NameEventSource(services);
        }
    }

    private static void AddHeartbeats(IServiceCollection services, TimeSpan scanEvery)
    {
        var (sweep, status, watch) = (new SweepHeartbeat(TimeProvider.System, scanEvery), new StatusHeartbeat(TimeProvider.System), new WatchHeartbeat(TimeProvider.System));
        services.AddSingleton(sweep).AddSingleton(status).AddSingleton(watch);
        services.AddSingleton<Heartbeat>(sweep).AddSingleton<Heartbeat>(status).AddSingleton<Heartbeat>(watch);
    }

    /// <summary>The source that the install script makes; without it the log files remain.</summary>
    [SupportedOSPlatform("windows")]
    private static void NameEventSource(IServiceCollection services) =>
        services.Configure<EventLogSettings>(settings => settings.SourceName = WindowsName);

    private static void Schedule(IQuartzBuilder quartz, Workplace workplace)
    {
        quartz.ConfigureScheduler(options => options.ShutdownJobInterruption = ShutdownJobInterruption.WhenWaitingForJobs);
        quartz.UseInMemoryStore();
        quartz.AddJob<SweepJob>(job => job.WithIdentity(SweepKey).StoreDurably());
        quartz.AddTrigger<SweepJob>(trigger => trigger
            .WithIdentity("scan")
            .ForJob(SweepKey)
            .StartNow()
            .WithSimpleSchedule(schedule => schedule.WithInterval(workplace.Configuration.ScanEvery.ToTimeSpan()).RepeatForever()));
        foreach (var contact in workplace.Configuration.Contacts)
        {
            quartz.AddTrigger<SweepJob>(trigger => trigger
                .WithIdentity($"brief-{contact.Id}")
                .ForJob(SweepKey)
                .WithSchedule(BriefTime(contact)));
        }
    }

    /// <summary>At the contact's own time and zone on the contact's weekdays; one that was missed fires once, and the notice's key keeps it single.</summary>
    private static CronScheduleBuilder BriefTime(Contact contact)
    {
        // Quartz counts weekdays from Sunday = 1.
        var weekdays = string.Join(',', contact.BriefDays.Order().Select(day => ((int)day % 7) + 1));
        var cron = FormattableString.Invariant($"0 {contact.BriefAt.Minute} {contact.BriefAt.Hour} ? * {weekdays}");
        return CronScheduleBuilder.Create(cron)
            .InTimeZone(TimeZoneInfo.FindSystemTimeZoneById(contact.Zone.Id))
            .WithMisfireInstruction(CronTriggerMisfireInstruction.FireAndProceed);
    }
}

/// <param name="Path">Of <c>loadwatch.json</c>.</param>
public sealed record ConfigurationFile(string Path);
