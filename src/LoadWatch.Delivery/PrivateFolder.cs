using System.Runtime.InteropServices;

namespace LoadWatch.Delivery;

/// <summary>A folder that only its owner reads (I-12), in which names can be made to survive a power cut.</summary>
internal static class PrivateFolder
{
    private const int ReadOnly = 0;

    /// <summary>Runs a piece of file work there; what the file system refuses becomes an outcome.</summary>
    /// <param name="sync">Whether its names have to survive a power cut.</param>
    public static ChannelOutcome Use(string folder, Action work, bool sync = true)
    {
        try
        {
            Create(folder);
            work();
            if (sync)
            {
                Sync(folder);
            }

            return ChannelOutcome.Delivered;
        }
        catch (UnauthorizedAccessException refused)
        {
            return ChannelOutcome.TryAgainSlowly(refused.Message);
        }
        catch (IOException trouble)
        {
            return ChannelOutcome.TryAgain(trouble.Message);
        }
    }

    /// <summary>A file's options: only its owner reads and writes it, and its bytes go to the disk when asked.</summary>
    public static FileStreamOptions Options(FileMode mode, FileAccess access)
    {
        var options = new FileStreamOptions { Mode = mode, Access = access, Share = FileShare.Read };
        if (!OperatingSystem.IsWindows())
        {
            options.UnixCreateMode = UnixFileMode.UserRead | UnixFileMode.UserWrite;
        }

        return options;
    }

    private static void Create(string folder)
    {
        if (OperatingSystem.IsWindows())
        {
            Directory.CreateDirectory(folder);
        }
        else
        {
            Directory.CreateDirectory(folder, UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute);
        }
    }

    /// <summary>A new name is durable once its folder is; Windows writes names through on its own.</summary>
    private static void Sync(string folder)
    {
        if (!OperatingSystem.IsLinux())
        {
            return;
        }

        var descriptor = Open(folder, ReadOnly);
        if (descriptor < 0)
        {
            throw new IOException($"the folder could not be opened to sync it: error {Marshal.GetLastPInvokeError()}");
        }

        var synced = Fsync(descriptor);
        var error = Marshal.GetLastPInvokeError();
        _ = Close(descriptor);
        if (synced != 0)
        {
            throw new IOException($"the folder could not be synced: error {error}");
        }
    }

    [DllImport("libc", EntryPoint = "open", SetLastError = true, BestFitMapping = false, ThrowOnUnmappableChar = true)]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern int Open([MarshalAs(UnmanagedType.LPUTF8Str)] string path, int flags);

    [DllImport("libc", EntryPoint = "fsync", SetLastError = true)]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern int Fsync(int descriptor);

    [DllImport("libc", EntryPoint = "close")]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern int Close(int descriptor);
}
