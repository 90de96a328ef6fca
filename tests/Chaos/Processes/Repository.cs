namespace LoadWatch.Chaos.Processes;

/// <summary>The sources around this program.</summary>
public static class Repository
{
    /// <summary>The folder of the solution, or null where the program lies elsewhere.</summary>
    public static string? Root { get; } = Above(new DirectoryInfo(AppContext.BaseDirectory));

    private static string? Above(DirectoryInfo? folder) =>
        folder is null || File.Exists(Path.Combine(folder.FullName, "LoadWatch.sln")) ? folder?.FullName : Above(folder.Parent);
}
