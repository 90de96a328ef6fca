namespace LoadWatch.Storage.Files;

/// <summary>Files and folders that only their owner can read (I-12). On Windows the folder's access list decides.</summary>
public static class PrivateFiles
{
    private const UnixFileMode OwnerFolder = UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute;
    private const UnixFileMode OwnerFile = UnixFileMode.UserRead | UnixFileMode.UserWrite;

    // 077: nothing for group and others.
    private const uint OthersAll = 0x3F;

    /// <summary>Makes whatever this process creates from now on private, by the libraries it uses too.</summary>
    public static void SetUmask()
    {
        if (!OperatingSystem.IsWindows())
        {
            _ = LinuxCalls.Umask(OthersAll);
        }
    }

    /// <summary>Creates a folder with mode 0700. False when it was there; its mode is then left alone.</summary>
    public static bool CreateFolder(string path)
    {
        if (Directory.Exists(path))
        {
            return false;
        }

        if (OperatingSystem.IsWindows())
        {
            Directory.CreateDirectory(path);
        }
        else
        {
            Directory.CreateDirectory(path, OwnerFolder);
        }

        return true;
    }

    /// <summary>Opens a file for writing, created with mode 0600 where it is new.</summary>
    public static FileStream OpenOrCreate(string path, FileShare share) =>
        Open(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, share, OwnerFile);

    /// <summary>Creates a new file with mode 0400: written through this stream only, read-only from then on.</summary>
    /// <exception cref="IOException">There is a file of this name.</exception>
    public static FileStream CreateOnce(string path) =>
        Open(path, FileMode.CreateNew, FileAccess.Write, FileShare.Read, UnixFileMode.UserRead);

    private static FileStream Open(string path, FileMode mode, FileAccess access, FileShare share, UnixFileMode createMode)
    {
        var options = new FileStreamOptions { Mode = mode, Access = access, Share = share, BufferSize = 0 };
        if (!OperatingSystem.IsWindows())
        {
            options.UnixCreateMode = createMode;
        }

        return new FileStream(path, options);
    }
}
