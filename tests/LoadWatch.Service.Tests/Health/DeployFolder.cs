namespace LoadWatch.Service.Tests.Health;

/// <summary>The files of <c>deploy/</c>, found upward from the test's own folder.</summary>
internal static class DeployFolder
{
    public static string Unit => Path.Combine(Root, "deploy", "linux", "loadwatch.service");

    public static string InstallScript => Path.Combine(Root, "deploy", "linux", "install.sh");

    public static string WindowsScript => Path.Combine(Root, "deploy", "windows", "install.ps1");

    private static string Root { get; } = Find(new DirectoryInfo(AppContext.BaseDirectory));

    private static string Find(DirectoryInfo folder) =>
        File.Exists(Path.Combine(folder.FullName, "LoadWatch.sln"))
            ? folder.FullName
            : Find(folder.Parent ?? throw new InvalidOperationException("no LoadWatch.sln above the tests"));
}
