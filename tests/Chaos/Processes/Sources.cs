namespace LoadWatch.Chaos.Processes;

/// <summary>A copy of the sources to build from: a build for one system would change the lock files and outputs of the working copy.</summary>
internal static class Sources
{
    private static readonly string[] LeftOut = ["bin", "obj", "packages.lock.json"];

    /// <returns>The folder of the copy.</returns>
    public static string CopyOf(string repository, string folder)
    {
        Directory.CreateDirectory(folder);
        foreach (var file in Directory.EnumerateFiles(repository).Where(file => Path.GetExtension(file) is ".json" or ".editorconfig" or ".config" or ".props"))
        {
            File.Copy(file, Path.Combine(folder, Path.GetFileName(file)));
        }

        foreach (var part in new[] { "src", "config" })
        {
            Copy(Path.Combine(repository, part), Path.Combine(folder, part));
        }

        return folder;
    }

    private static void Copy(string from, string to)
    {
        Directory.CreateDirectory(to);
        foreach (var entry in new DirectoryInfo(from).EnumerateFileSystemInfos().Where(entry => !LeftOut.Contains(entry.Name, StringComparer.Ordinal)))
        {
            var target = Path.Combine(to, entry.Name);
            if (entry is FileInfo file)
            {
                file.CopyTo(target);
            }
            else
            {
                Copy(entry.FullName, target);
            }
        }
    }
}
