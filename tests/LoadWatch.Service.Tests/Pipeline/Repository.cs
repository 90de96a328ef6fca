namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>The repository around the test.</summary>
internal static class Repository
{
    /// <summary>A folder of the repository; the test is skipped where it runs without one.</summary>
    public static string Folder(params string[] below)
    {
        Assert.SkipWhen(Root is null, "the tests do not run inside the repository");
        return Path.Combine([Root!, .. below]);
    }

    private static string? Root { get; } = Above(new DirectoryInfo(AppContext.BaseDirectory));

    private static string? Above(DirectoryInfo? folder) =>
        folder is null || File.Exists(Path.Combine(folder.FullName, "LoadWatch.sln")) ? folder?.FullName : Above(folder.Parent);
}
