using LoadWatch.People;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Health;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.Hosting;
using NodaTime;
using Quartz;
using Serilog;

namespace LoadWatch.Service.Schedule;

/// <summary>Assembles the process that runs every night.</summary>
public static class ServiceHost
{
    private static readonly JobKey SweepKey = new("sweep");

    /// <summary>Quartz in memory: schedules come from the configuration, and what was missed is caught up from our own tables (I-7).</summary>
    public static IHost Build(Workplace workplace, string configPath)
    {
        var builder = Host.CreateApplicationBuilder(new HostApplicationBuilderSettings { ContentRootPath = AppContext.BaseDirectory });
        builder.Services.AddSystemd();
        builder.Services.AddWindowsService(options => options.ServiceName = "LoadWatch");
        builder.Services.AddSerilog(logger => ServiceLog.Configure(logger, workplace.Folder.Root, toConsole: true));
        builder.Services.Configure<HostOptions>(options => options.ShutdownTimeout = TimeSpan.FromSeconds(20));
        builder.Services.AddSingleton(TimeProvider.System);
        builder.Services.AddSingleton(workplace);
        builder.Services.AddSingleton(new ConfigurationFile(configPath));
        builder.Services.AddSingleton<StatusFile>();
        builder.Services.AddQuartz(quartz => Schedule(quartz, workplace));
        builder.Services.AddQuartzHostedService(options => options.WaitForJobsToComplete = true);
        builder.Services.AddHostedService<InboxWatcher>();
        return builder.Build();
    }

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
