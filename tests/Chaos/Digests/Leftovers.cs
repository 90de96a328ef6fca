using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Digests;

/// <summary>Nothing half-done stays behind, and only the owner reads what is there (I-12).</summary>
public static class Leftovers
{
    private const UnixFileMode ForOthers = UnixFileMode.GroupRead | UnixFileMode.GroupWrite | UnixFileMode.GroupExecute
        | UnixFileMode.OtherRead | UnixFileMode.OtherWrite | UnixFileMode.OtherExecute;

    private static readonly string[] Written = ["data", "pages", "notices"];

    /// <exception cref="ChaosFailureException">Something lies about or may be read by others.</exception>
    public static void MustBeNone(Place place)
    {
        ArgumentNullException.ThrowIfNull(place);
        var found = Directory.EnumerateFiles(place.Root, "*", SearchOption.AllDirectories).Where(IsHalfDone).Concat(Written.SelectMany(folder => Open(place.At(folder)))).ToList();
        if (found.Count > 0)
        {
            throw new ChaosFailureException($"left behind, or open to others: {string.Join(", ", found)}");
        }
    }

    private static bool IsHalfDone(string path)
    {
        var name = Path.GetFileName(path);
        return name.EndsWith(".part", StringComparison.Ordinal) || name.EndsWith(".tmp", StringComparison.Ordinal)
            || name.StartsWith(".loadwatch-", StringComparison.Ordinal)
            || path.Contains("/archive/incoming/", StringComparison.Ordinal);
    }

    private static IEnumerable<string> Open(string folder) => !Directory.Exists(folder)
        ? []
        : Directory.EnumerateFileSystemEntries(folder, "*", SearchOption.AllDirectories).Prepend(folder)
            .Where(path => !OperatingSystem.IsWindows() && (File.GetUnixFileMode(path) & ForOthers) != UnixFileMode.None);
}
