namespace LoadWatch.Service.Tests.Health;

/// <summary>The install scripts, as far as they can be tried without touching the machine.</summary>
public sealed class InstallScriptTests : IDisposable
{
    /// <summary>Stands in for a published folder: all that the script asks of the program is a new working folder.</summary>
    private const string Program = """
        #!/usr/bin/env bash
        mkdir -p "$3"
        echo "person,name" >"$3/roster.csv"
        echo "person,date" >"$3/anchors.csv"

        """;

    private readonly DirectoryInfo root = Directory.CreateTempSubdirectory("loadwatch-install-");

    private string Published => Path.Combine(root.FullName, "published");

    private string Target => Path.Combine(root.FullName, "target");

    public void Dispose() => root.Delete(recursive: true);

    [Fact]
    public async Task PrintingDoesNothing()
    {
        Publish();
        var (code, text) = await Script("--print", "--root", Target, Published);
        Assert.True(code == 0, text);
        Assert.Contains(Path.Combine(Target, "etc/systemd/system/loadwatch.service"), text, StringComparison.Ordinal);
        Assert.False(Directory.Exists(Target));
    }

    [Fact]
    public async Task InstallingAgainLeavesTheConfigurationAndReplacesTheProgram()
    {
        Publish();
        await Installed();
        var config = Path.Combine(Target, "etc/loadwatch/loadwatch.json");
        File.WriteAllText(config, "mine");
        File.AppendAllText(Path.Combine(Published, "loadwatch"), "# newer\n");
        await Installed();
        Assert.Equal("mine", File.ReadAllText(config));
        Assert.Equal(Program + "# newer\n", File.ReadAllText(Path.Combine(Target, "opt/loadwatch/loadwatch")));
        Assert.Equal(File.ReadAllText(DeployFolder.Unit), File.ReadAllText(Path.Combine(Target, "etc/systemd/system/loadwatch.service")));
    }

    [Fact]
    public async Task FoldersAndFilesAreAsOpenAsTheyMustBe()
    {
        Publish();
        await Installed();
        Assert.Equal("750", Mode("etc/loadwatch"));
        Assert.Equal("640", Mode("etc/loadwatch/loadwatch.json"));
        Assert.Equal("640", Mode("etc/loadwatch/roster.csv"));
        Assert.Equal("700", Mode("var/lib/loadwatch"));
        Assert.Equal("2770", Mode("srv/loadwatch/inbox"));
        Assert.Equal("755", Mode("opt/loadwatch/loadwatch"));
    }

    [Fact]
    public async Task UninstallingKeepsConfigurationDataAndInbox()
    {
        Publish();
        await Installed();
        File.WriteAllText(Path.Combine(Target, "var/lib/loadwatch/kept"), "");
        var (code, text) = await Script("--root", Target, "--uninstall");
        Assert.True(code == 0, text);
        var left = Directory.EnumerateFiles(Target, "*", SearchOption.AllDirectories).Select(path => Path.GetRelativePath(Target, path)).Order(StringComparer.Ordinal);
        Assert.Equal(["etc/loadwatch/anchors.csv", "etc/loadwatch/loadwatch.json", "etc/loadwatch/roster.csv", "var/lib/loadwatch/kept"], left);
    }

    [Fact]
    public async Task AFolderWithoutTheProgramIsNotInstalled()
    {
        Assert.SkipUnless(IsPossible, "needs Linux with bash");
        var (code, text) = await Script("--root", Target, root.FullName);
        Assert.Equal((66, false), (code, Directory.Exists(Target)));
        Assert.Contains("dotnet publish", text, StringComparison.Ordinal);
    }

    [Fact]
    public async Task ShellcheckFindsNothing()
    {
        Assert.SkipUnless(Tool.IsThere("shellcheck"), "needs shellcheck");
        Assert.Equal((0, ""), await Tool.Run("shellcheck", DeployFolder.InstallScript));
    }

    [Fact]
    public void WindowsIsToldToStartAFailedServiceAgain()
    {
        var script = File.ReadAllText(DeployFolder.WindowsScript);
        Assert.Contains("failureflag", script, StringComparison.Ordinal);
        Assert.Contains("delayed-auto", script, StringComparison.Ordinal);
        Assert.Contains(@"NT SERVICE\", script, StringComparison.Ordinal);
        Assert.Contains("SupportsShouldProcess", script, StringComparison.Ordinal);
    }

    private static bool IsPossible => OperatingSystem.IsLinux() && Tool.IsThere("bash");

    private void Publish()
    {
        Assert.SkipUnless(IsPossible, "needs Linux with bash");
        Directory.CreateDirectory(Published);
        var program = Path.Combine(Published, "loadwatch");
        File.WriteAllText(program, Program);
        if (!OperatingSystem.IsWindows())
        {
            File.SetUnixFileMode(program, UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute);
        }
    }

    private async Task Installed()
    {
        var (code, text) = await Script("--root", Target, Published);
        Assert.True(code == 0, text);
    }

    private static Task<(int Code, string Text)> Script(params string[] words) => Tool.Run("bash", [DeployFolder.InstallScript, .. words]);

    private string Mode(string path) => OperatingSystem.IsWindows() ? "" : Convert.ToString((int)File.GetUnixFileMode(Path.Combine(Target, path)), 8);
}
