namespace LoadWatch.Service.Tests.Configuration;

/// <summary>The folder of the sources, found upward from the test's own.</summary>
internal static class Repository
{
    public static string Root { get; } = Find(new DirectoryInfo(AppContext.BaseDirectory));

    public static string Config(string name) => Path.Combine(Root, "config", name);

    private static string Find(DirectoryInfo folder) =>
        File.Exists(Path.Combine(folder.FullName, "LoadWatch.sln"))
            ? folder.FullName
            : Find(folder.Parent ?? throw new InvalidOperationException("no LoadWatch.sln above the tests"));
}
