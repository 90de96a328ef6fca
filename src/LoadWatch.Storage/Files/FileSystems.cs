namespace LoadWatch.Storage.Files;

/// <summary>What kind of file system a folder lies on. The write-ahead log needs memory that all its users share, so it works on one machine only.</summary>
public static class FileSystems
{
    /// <summary>
    /// Type numbers of file systems that come over a network, from the manual page statfs(2) and the kernel's <c>magic.h</c>. FUSE is not among them: many
    /// local disks are mounted by it.
    /// </summary>
    private static readonly Dictionary<uint, string> Networks = new()
    {
        [0x00006969] = "nfs",
        [0x0000517B] = "smb",
        [0xFF534D42] = "cifs",
        [0xFE534D42] = "smb2",
        [0x5346414F] = "afs",
        [0x6B414653] = "afs",
        [0x00C36400] = "ceph",
        [0x73757245] = "coda",
        [0x0000564C] = "ncp",
        [0x01021997] = "9p",
        [0x01161970] = "gfs2",
        [0x7461636F] = "ocfs2",
        [0x0BD00BD0] = "lustre",
        [0x47504653] = "gpfs",
        [0x786F4256] = "vboxsf",
    };

    /// <summary>Name of the network file system that a folder lies on; null where it lies on a disk of this machine, or where it cannot be told.</summary>
    public static string? NetworkOf(string path) =>
        OperatingSystem.IsWindows() ? NetworkOnWindows(path) : OperatingSystem.IsLinux() ? NetworkOfType(TypeOf(path)) : null;

    /// <param name="type">As statfs(2) tells it.</param>
    public static string? NetworkOfType(uint? type) => type is { } known ? Networks.GetValueOrDefault(known) : null;

    private static uint? TypeOf(string path) => LinuxCalls.FileSystem(path, out var status) == 0 ? unchecked((uint)status.Type) : null;

    private static string? NetworkOnWindows(string path)
    {
        var root = Path.GetPathRoot(path)!;
        return root.StartsWith(@"\\", StringComparison.Ordinal) || new DriveInfo(root).DriveType == DriveType.Network ? "share" : null;
    }
}
