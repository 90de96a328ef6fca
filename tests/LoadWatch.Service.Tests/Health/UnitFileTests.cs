using System.Globalization;
using System.Text.RegularExpressions;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Schedule;

namespace LoadWatch.Service.Tests.Health;

/// <summary>The systemd unit agrees with the program and keeps its rights small.</summary>
public sealed partial class UnitFileTests
{
    /// <summary>Where the install script puts things; the unit names no other place of any machine.</summary>
    private static readonly string[] Places = ["/opt/loadwatch", "/etc/loadwatch", "/var/lib/loadwatch", "/srv/loadwatch"];

    private static readonly ILookup<string, string> Lines = File.ReadLines(DeployFolder.Unit)
        .Select(line => line.Split('=', 2))
        .Where(parts => parts.Length == 2 && !parts[0].StartsWith('#'))
        .ToLookup(parts => parts[0], parts => parts[1], StringComparer.Ordinal);

    [Fact]
    public void WhatNoNewStartMendsIsNotStartedAgain()
    {
        int[] final = [ExitCode.Usage, ExitCode.Data, ExitCode.Configuration];
        Assert.Equal(final, Only("RestartPreventExitStatus").Split(' ').Select(code => int.Parse(code, CultureInfo.InvariantCulture)));
        Assert.Equal("on-failure", Only("Restart"));
    }

    [Fact]
    public void SystemdWaitsLongerForTheEndThanTheServiceDoes() => Assert.True(Seconds("TimeoutStopSec") > ServiceHost.StopsWithin.TotalSeconds + 5);

    [Fact]
    public void AStopIsShorterThanThePatienceOfTheWatchdog() => Assert.True(Seconds("WatchdogSec") / 2 > ServiceHost.StopsWithin.TotalSeconds);

    [Fact]
    public void TheRuntimeStartsAndNotifiesUnderTheseRights()
    {
        Assert.Equal("notify", Only("Type"));
        Assert.Empty(Lines["ProtectProc"]);
        Assert.Empty(Lines["MemoryDenyWriteExecute"]);
        Assert.Equal(["@system-service", "~@privileged @resources", "sched_setaffinity sched_setscheduler"], Lines["SystemCallFilter"]);
        Assert.Equal("EPERM", Only("SystemCallErrorNumber"));
        Assert.Equal("DOTNET_EnableDiagnostics=0", Only("Environment"));
    }

    [Fact]
    public void OnlyTheStateFolderCanBeWritten()
    {
        Assert.Equal(("strict", "loadwatch", "0700", "0077"), (Only("ProtectSystem"), Only("StateDirectory"), Only("StateDirectoryMode"), Only("UMask")));
        Assert.Empty(Lines["ReadWritePaths"]);
    }

    [Fact]
    public void NoPlaceOfAnotherMachineIsNamed()
    {
        var paths = Lines.SelectMany(values => values).SelectMany(value => AbsolutePath().Matches(value)).Select(match => match.Value).ToList();
        Assert.NotEmpty(paths);
        Assert.All(paths, path => Assert.Contains(Places, place => path.StartsWith(place, StringComparison.Ordinal)));
    }

    [Fact]
    public async Task SystemdTakesTheUnitAsItIs()
    {
        Assert.SkipUnless(Tool.IsThere("systemd-analyze"), "needs systemd-analyze");
        var folder = Directory.CreateTempSubdirectory("loadwatch-unit-");
        try
        {
            // The program is not installed where the tests run.
            var unit = Path.Combine(folder.FullName, "loadwatch.service");
            var text = await File.ReadAllTextAsync(DeployFolder.Unit, TestContext.Current.CancellationToken);
            await File.WriteAllTextAsync(unit, text.Replace(Only("ExecStart"), "/bin/true", StringComparison.Ordinal), TestContext.Current.CancellationToken);
            Assert.Equal((0, ""), await Tool.Run("systemd-analyze", "verify", "--man=no", unit));
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    /// <summary>systemd's own measure from 0 (nothing allowed) to 10; the option counts in tenths. 1.4 with systemd 252.</summary>
    [Fact]
    public async Task TheExposureIsSmall()
    {
        Assert.SkipUnless(Tool.IsThere("systemd-analyze"), "needs systemd-analyze");
        var (code, text) = await Tool.Run("systemd-analyze", "security", "--offline=true", "--no-pager", "--threshold=15", DeployFolder.Unit);
        Assert.True(code == 0, text);
    }

    private static string Only(string key) => Assert.Single(Lines[key]);

    private static double Seconds(string key) => double.Parse(Only(key), CultureInfo.InvariantCulture);

    [GeneratedRegex("(?<![A-Za-z0-9])/[A-Za-z0-9/._-]+", RegexOptions.None, matchTimeoutMilliseconds: 1000)]
    private static partial Regex AbsolutePath();
}
