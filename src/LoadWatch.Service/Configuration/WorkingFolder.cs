using LoadWatch.Service.Arrivals;

namespace LoadWatch.Service.Configuration;

/// <summary>What making a working folder did.</summary>
/// <param name="IsNew">Whether there was no configuration before.</param>
/// <param name="Written">Full paths of the files written.</param>
/// <param name="PersonFolders">Full paths of the sub-folders made for people of the roster.</param>
public sealed record WorkingFolder(bool IsNew, IReadOnlyList<string> Written, IReadOnlyList<string> PersonFolders)
{
    /// <summary>Writes what is missing and never over a file: a whole new folder, or the schema and the people's sub-folders of one that is there.</summary>
    /// <exception cref="ConfigurationException">The configuration that is there has faults.</exception>
    public static WorkingFolder Make(string folder)
    {
        var configuration = Path.Combine(folder, StarterFiles.Configuration);
        var isNew = !File.Exists(configuration);
        var written = new List<string>();
        if (isNew)
        {
            Directory.CreateDirectory(Path.Combine(folder, "inbox"));
            written.AddRange(StarterFiles.All.Where(file => WriteNew(folder, file.Key, file.Value)).Select(file => Path.Combine(folder, file.Key)));
        }

        if (WriteNew(folder, StarterFiles.Schema, ConfigurationSchema.Write()))
        {
            written.Add(Path.Combine(folder, StarterFiles.Schema));
        }

        return new WorkingFolder(isNew, written, Inboxes.MakePersonFolders(ConfigurationReader.Read(configuration)));
    }

    private static bool WriteNew(string folder, string name, string text)
    {
        var path = Path.Combine(folder, name);
        if (File.Exists(path))
        {
            return false;
        }

        File.WriteAllText(path, text.ReplaceLineEndings("\n"));
        return true;
    }
}
