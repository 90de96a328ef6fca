namespace LoadWatch.Service.Commands;

/// <summary>Marks a folder as written by the demo, so that the next run may replace it and nothing else is ever deleted.</summary>
public static class DemoMark
{
    private const string Name = ".loadwatch-demo";

    /// <summary>Empties a folder that a demo wrote. False where the folder holds anything else.</summary>
    public static bool Clear(string folder)
    {
        if (!Directory.Exists(folder) || !Directory.EnumerateFileSystemEntries(folder).Any())
        {
            return true;
        }

        if (!File.Exists(Path.Combine(folder, Name)))
        {
            return false;
        }

        Directory.Delete(folder, recursive: true);
        return true;
    }

    public static void Set(string folder) => File.WriteAllText(Path.Combine(folder, Name), "Written by loadwatch demo; a new demo replaces this folder.\n");
}
