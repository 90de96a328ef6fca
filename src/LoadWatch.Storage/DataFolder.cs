using System.Globalization;
using LoadWatch.Storage.Files;

namespace LoadWatch.Storage;

/// <summary>The one folder that holds everything LoadWatch knows: the archive of originals and the database. Private to its owner (I-12).</summary>
public sealed class DataFolder
{
    private DataFolder(string path)
    {
        Root = path;
        ArchivePath = Path.Combine(path, "archive");
        IncomingPath = Path.Combine(ArchivePath, "incoming");
        DatabasePath = Path.Combine(path, "loadwatch.db");
        LockPath = Path.Combine(path, "loadwatch.lock");
    }

    public string Root { get; }

    public string ArchivePath { get; }

    /// <summary>Where copies are written before they get their name.</summary>
    public string IncomingPath { get; }

    public string DatabasePath { get; }

    public string LockPath { get; }

    /// <summary>Names a data folder and touches nothing.</summary>
    public static DataFolder At(string path) => new(Path.GetFullPath(path));

    /// <summary>Opens a data folder and creates what is missing of it.</summary>
    /// <exception cref="IOException">It cannot be created.</exception>
    /// <exception cref="UnauthorizedAccessException">It cannot be created.</exception>
    public static DataFolder Open(string path)
    {
        var folder = At(path);
        folder.CreateMissing();
        return folder;
    }

    /// <summary>Whether the archive holds an object.</summary>
    public bool HoldsOriginals() => Objects().Any();

    /// <summary>Paths of all objects of the archive, folder by folder.</summary>
    public IEnumerable<string> Objects() => Directory.EnumerateDirectories(ArchivePath)
        .Where(folder => folder != IncomingPath)
        .Order(StringComparer.Ordinal)
        .SelectMany(Directory.EnumerateFiles);

    /// <summary>The folder of the archive that holds the objects whose name begins with these two hex digits.</summary>
    public string ObjectFolder(string sha) => Path.Combine(ArchivePath, sha[..2]);

    // An object is durable only if the names of all folders above it are.
    private void CreateMissing()
    {
        if (PrivateFiles.CreateFolder(Root))
        {
            DurableFile.SyncFolder(Path.GetDirectoryName(Root)!);
        }

        PrivateFiles.CreateFolder(ArchivePath);
        var created = PrivateFiles.CreateFolder(IncomingPath);
        for (var number = 0; number < 256; number++)
        {
            created |= PrivateFiles.CreateFolder(ObjectFolder(number.ToString("x2", CultureInfo.InvariantCulture)));
        }

        if (created)
        {
            DurableFile.SyncFolder(ArchivePath);
            DurableFile.SyncFolder(Root);
        }
    }
}
