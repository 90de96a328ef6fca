using System.Globalization;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;

namespace LoadWatch.Service.Tests.Health;

/// <summary>What systemd and a shell hear of the running service.</summary>
public sealed class SystemdTests : IDisposable
{
    private readonly DirectoryInfo folder = Directory.CreateTempSubdirectory("loadwatch-systemd-");

    public SystemdTests()
    {
        foreach (var (name, text) in StarterFiles.All)
        {
            File.WriteAllText(Path.Combine(folder.FullName, name), text);
        }

        folder.CreateSubdirectory("inbox");
    }

    private string Config => Path.Combine(folder.FullName, "loadwatch.json");

    private string Data => Path.Combine(folder.FullName, "data");

    public void Dispose() => folder.Delete(recursive: true);

    [Fact]
    public async Task TheServiceTellsSystemdOfItsStartItsWorkAndItsEnd()
    {
        Assert.SkipUnless(SupervisedService.IsPossible, "needs Linux with bash and dotnet");
        using var service = new SupervisedService(folder.FullName, watchdog: TimeSpan.FromSeconds(1));
        var id = await service.Id();
        await service.Hears("READY=1");
        Assert.True(File.Exists(Path.Combine(Data, "loadwatch.db")), "ready before the database is");
        var held = Assert.Throws<InstanceRunningException>(() => InstanceLock.Take(DataFolder.Open(Data)));
        Assert.Equal(id, held.ProcessId);
        await service.Hears("WATCHDOG=1");
        await service.Hears("WATCHDOG=1");
        await Tool.Run("kill", "-TERM", id.ToString(CultureInfo.InvariantCulture));
        await service.Hears("STOPPING=1");
        Assert.Equal(0, await service.ExitCode());
    }

    [Fact]
    public async Task AFaultyConfigurationEndsTheServiceWithACodeThatIsNotStartedAgain()
    {
        Assert.SkipUnless(SupervisedService.IsPossible, "needs Linux with bash and dotnet");
        await File.WriteAllTextAsync(Config, "{ \"inboxs\": [] }", TestContext.Current.CancellationToken);
        using var service = new SupervisedService(folder.FullName, watchdog: TimeSpan.FromSeconds(1));
        await service.Id();
        Assert.Equal(78, await service.ExitCode());
    }

    /// <summary>After a failed sync the system may have dropped what was written: only a new start finds out what is there.</summary>
    [Fact]
    public async Task ADiskThatDoesNotKeepWhatIsWrittenEndsTheService()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux() && Tool.IsThere("strace"), "needs strace");
        string[] loadwatch = ["dotnet", Path.Combine(AppContext.BaseDirectory, "loadwatch.dll")];
        var (made, text) = await Tool.Run(loadwatch[0], [.. loadwatch[1..], "sweep", "--config", Config]);
        Assert.True(made == 0, text);
        await File.AppendAllTextAsync(Path.Combine(folder.FullName, "roster.csv"), "anna,Anna Ahola,squad,1996,f,UTC\n", TestContext.Current.CancellationToken);
        string[] strace = ["-f", "-qq", "-o", Path.Combine(folder.FullName, "trace"), "-e", "trace=fsync,fdatasync", "-e", "inject=fsync,fdatasync:error=EIO"];
        var (code, output) = await Tool.Run("strace", [.. strace, .. loadwatch, "run", "--config", Config]);
        Assert.SkipWhen(output.Contains("ptrace", StringComparison.OrdinalIgnoreCase), "strace may not trace here");
        Assert.True(code == 74, $"{code}: {output}");
    }

    /// <summary>Also a failed sync of the archive's own folders, which the database knows nothing of.</summary>
    [Fact]
    public async Task AnArchiveThatIsNotKeptEndsTheService()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux() && Tool.IsThere("strace"), "needs strace");
        await File.AppendAllTextAsync(Path.Combine(folder.FullName, "roster.csv"), "anna,Anna Ahola,squad,1996,f,UTC\n", TestContext.Current.CancellationToken);
        string[] loadwatch = ["dotnet", Path.Combine(AppContext.BaseDirectory, "loadwatch.dll")];
        var (made, text) = await Tool.Run(loadwatch[0], [.. loadwatch[1..], "sweep", "--config", Config]);
        Assert.True(made == 0, text);
        var ride = Pipeline.Some.Fit(Pipeline.Some.Yesterday);
        var drop = Path.Combine(folder.FullName, "inbox", "anna", "ride.fit");
        await File.WriteAllBytesAsync(drop, ride, TestContext.Current.CancellationToken);
        File.SetLastWriteTimeUtc(drop, DateTime.UnixEpoch);
        var objects = Path.Combine(Data, "archive", Pipeline.WorkingFolder.Sha(ride)[..2]);
        string[] strace = ["-f", "-qq", "-o", Path.Combine(folder.FullName, "trace"), "-P", objects, "-e", "trace=fsync", "-e", "inject=fsync:error=EIO"];
        var (code, output) = await Tool.Run("strace", [.. strace, .. loadwatch, "run", "--config", Config]);
        Assert.SkipWhen(output.Contains("ptrace", StringComparison.OrdinalIgnoreCase), "strace may not trace here");
        Assert.True(code == 74, $"{code}: {output}");
    }
}
