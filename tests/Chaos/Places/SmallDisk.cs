namespace LoadWatch.Chaos.Places;

/// <summary>A folder of a place on a disk of its own, in memory, whose size may change under a running service. At the end it lies where it lay, as it is then.</summary>
public sealed class SmallDisk : IDisposable
{
    public const long PageBytes = 4096;

    private const string Ample = "size=256m,nr_inodes=100k";

    private readonly MountRoom room = new();
    private readonly string path;
    private readonly string below;
    private bool isBack;

    /// <param name="path">The folder that moves onto the disk.</param>
    public SmallDisk(string path)
    {
        (this.path, below) = (path, path + ".below");
        Directory.Move(path, below);
        Directory.CreateDirectory(path);
        room.Mount("-t", "tmpfs", "-o", Ample + ",mode=700", "chaos", path);
        room.Do("cp", "-a", below + "/.", path);
    }

    /// <summary>Run a program that sees the disk.</summary>
    public IReadOnlyList<string> Words => room.Words;

    /// <summary>A path on it as it is seen from outside.</summary>
    public string Outside(string path) => room.Outside(path);

    public long UsedBytes => Drive.TotalSize - Drive.TotalFreeSpace;

    /// <summary>Files and folders on it, itself included.</summary>
    public long UsedInodes => Directory.EnumerateFileSystemEntries(room.Outside(path), "*", SearchOption.AllDirectories).LongCount() + 1;

    private DriveInfo Drive => new(room.Outside(path));

    /// <summary>Leaves so many bytes beyond what is used.</summary>
    public void LeaveBytes(long free) => Resize(FormattableString.Invariant($"size={UsedBytes + free}"));

    /// <summary>Leaves room for so many more files.</summary>
    public void LeaveInodes(long free) => Resize(FormattableString.Invariant($"nr_inodes={UsedInodes + free}"));

    public void MakeAmple() => Resize(Ample);

    /// <summary>Puts the folder back where it lay; the disk ends.</summary>
    public void BringBack()
    {
        Directory.Delete(below, recursive: true);
        room.Do("cp", "-a", path, below);
        room.Dispose();
        Directory.Delete(path);
        Directory.Move(below, path);
        isBack = true;
    }

    public void Dispose()
    {
        if (!isBack)
        {
            room.Dispose();
        }
    }

    private void Resize(string options) => room.Mount("-o", "remount," + options, path);
}
