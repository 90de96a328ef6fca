using System.CommandLine;
using System.Data.Common;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Schedule;
using LoadWatch.Storage;
using LoadWatch.Storage.Dialects;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Commands;

/// <summary>The commands of <c>loadwatch</c> and how each kind of failure ends it.</summary>
public static class CommandLine
{
    /// <returns>An exit code of <see cref="ExitCode"/>.</returns>
    public static async Task<int> RunAsync(string[] args)
    {
        PrivateFiles.SetUmask();
        var parsed = Root().Parse(args);
        if (parsed.Errors.Count > 0)
        {
            foreach (var error in parsed.Errors)
            {
                await Console.Error.WriteLineAsync(error.Message);
            }

            await Console.Error.WriteLineAsync("See loadwatch --help, or loadwatch COMMAND --help.");
            return ExitCode.Usage;
        }

        try
        {
            return await parsed.InvokeAsync(new InvocationConfiguration
            {
                EnableDefaultExceptionHandler = false,

                // The library's own two seconds would cut the transaction under way off.
                ProcessTerminationTimeout = ServiceHost.StopsWithin + TimeSpan.FromSeconds(5),
            });
        }
        catch (Exception e) when (Expected(e) is { } code)
        {
            await TellAsync(Told(e));
            return code;
        }
        catch (Exception e)
        {
            await TellAsync($"A defect of LoadWatch, please report it:{Environment.NewLine}{e}");
            return ExitCode.Software;
        }
    }

    private static async Task TellAsync(string text)
    {
        try
        {
            await Console.Error.WriteLineAsync(text);
        }
        catch (IOException)
        {
            // The terminal is gone, or no file handle is left to write to it: the exit code still tells.
        }
    }

    /// <summary>Every command, in the order of a new user's day.</summary>
    public static RootCommand Root() => new("Takes in wearable recordings overnight and tells staff in the morning who is well above their usual, who has "
        + "had no heavy or fast work for too long, and whose recordings are missing.")
    {
        DemoCommand.Create(),
        InitCommand.Create(),
        CheckCommand.Create(),
        SweepCommand.Create(),
        RunCommand.Create(),
        BriefCommand.Create(),
        PeopleCommand.Create(),
        AlertsCommand.Create(),
        RulesCommand.Create(),
        AckCommand.Create(),
        ShelveCommand.Create(),
        AwayCommand.Create(),
        AssignCommand.Create(),
        ExplainCommand.Create(),
        InspectCommand.Create(),
        LayoutCommand.Create(),
        ExportCommand.Create(),
        ReplayCommand.Create(),
        RebuildCommand.Create(),
        VerifyCommand.Create(),
        StatusCommand.Create(),
        MailTestCommand.Create(),
    };

    private static string Told(Exception e) => e switch
    {
        DbException database when StoreTroubles.Of(database) == StoreTrouble.Damaged => $"{database.Message}: {StoreTroubles.AdviceOfDamage}.",
        DbException database when StoreTroubles.Of(database) == StoreTrouble.Busy => "Another program holds the database: try again in a moment.",
        _ when Within(e) is { } inner => Told(inner),
        _ => e.Message,
    };

    /// <summary>What an exception only stands around: several tasks, or a part of the program that could not be loaded.</summary>
    private static Exception? Within(Exception e) => e is AggregateException or TypeInitializationException ? e.InnerException : null;

    private static int? Expected(Exception e) => e switch
    {
        ConfigurationException or NewerDatabaseException => ExitCode.Configuration,
        InstanceRunningException => ExitCode.TryLater,
        DatabaseRefusedException or InvalidDataException => ExitCode.Data,
        _ when Within(e) is { } inner => Expected(inner),
        DurabilityLostException => ExitCode.InputOutput,
        DbException database => StoreTroubles.Of(database) switch
        {
            StoreTrouble.Damaged => ExitCode.Data,
            StoreTrouble.Busy => ExitCode.TryLater,
            StoreTrouble.Disk => ExitCode.InputOutput,
            _ => null,
        },
        OperationCanceledException => ExitCode.Interrupted,
        UnauthorizedAccessException => ExitCode.NoPermission,
        IOException => ExitCode.InputOutput,
        _ => null,
    };
}
