using System.Runtime.InteropServices;

namespace LoadWatch.Storage.Files;

/// <summary>The steps that make a file survive a power cut, each a step of its own because their order is what counts (I-2).</summary>
public static class DurableFile
{
    /// <summary>Makes the bytes of a written file durable.</summary>
    /// <exception cref="DurabilityLostException">The disk failed: nothing that was written lately can be trusted.</exception>
    /// <exception cref="IOException">There is no room for them.</exception>
    public static void Sync(FileStream file)
    {
        if (OperatingSystem.IsWindows())
        {
            file.Flush(flushToDisk: true);
            return;
        }

        file.Flush();
        Sync(file.SafeFileHandle.DangerousGetHandle().ToInt32(), file.Name);
    }

    /// <summary>Makes the names in a folder durable. Windows has no such call: its file systems log names by themselves.</summary>
    /// <inheritdoc cref="Sync(FileStream)"/>
    public static void SyncFolder(string path)
    {
        if (OperatingSystem.IsWindows())
        {
            return;
        }

        var descriptor = LinuxCalls.Open(path, LinuxCalls.OnlyFolder | LinuxCalls.CloseOnExec);
        if (descriptor < 0)
        {
            throw Failed("open folder", path);
        }

        try
        {
            Sync(descriptor, path);
        }
        finally
        {
            _ = LinuxCalls.Close(descriptor);
        }
    }

    /// <summary>Starts the disk on what was written, without waiting for it: a hint only, the sync that follows has less to do.</summary>
    public static void BeginSync(FileStream file)
    {
        if (!OperatingSystem.IsLinux())
        {
            return;
        }

        try
        {
            _ = LinuxCalls.SyncRange(file.SafeFileHandle, 0, 0, LinuxCalls.StartWriting);
        }
        catch (EntryPointNotFoundException)
        {
            // A system without the call: the sync alone does it.
        }
    }

    /// <summary>Renames within one file system in one step. False, and nothing changed, when the new name is taken.</summary>
    /// <exception cref="IOException">The system refused for another reason.</exception>
    public static bool RenameWithoutOverwrite(string from, string to) =>
        OperatingSystem.IsLinux() ? RenameOnLinux(from, to) : RenameElsewhere(from, to);

    /// <summary>
    /// Writes a whole file in place of another: aside, then renamed. A reader meets the old or the new one. It is not synced, for files that are written anew
    /// all the time: only a power cut can tear it.
    /// </summary>
    public static void Replace(string path, ReadOnlySpan<byte> bytes)
    {
        var aside = path + ".part";
        File.Delete(aside);
        using (var file = PrivateFiles.OpenOrCreate(aside, FileShare.None))
        {
            file.Write(bytes);
        }

        KillPoint.Pass("replaced");
        File.Move(aside, path, overwrite: true);
    }

    // Where a file system cannot sync (EINVAL, ENOTSUP, EROFS) nothing was promised and nothing was lost; where it is full the copy goes, and the next one
    // may find room. After anything else the system may have dropped what it could not write, and the next sync would claim success over it.
    private static void Sync(int descriptor, string path)
    {
        switch (ErrorOfSync(descriptor))
        {
            case 0:
                return;
            case Errno.Invalid or Errno.NotSupported or Errno.ReadOnly:
                return;
            case Errno.NoSpace or Errno.NoQuota:
                throw Failed("sync", path);
            default:
                throw new DurabilityLostException(Failed("sync", path));
        }
    }

    private static int ErrorOfSync(int descriptor)
    {
        int error;
        do
        {
            error = LinuxCalls.Sync(descriptor) == 0 ? 0 : Marshal.GetLastPInvokeError();
        }
        while (error == Errno.Interrupted);
        return error;
    }

    private static bool RenameOnLinux(string from, string to)
    {
        switch (RenameInOneStep(from, to))
        {
            case 0:
                return true;
            case Errno.Exists:
                return false;
            case Errno.NoSystemCall or Errno.Invalid:
                return RenameByLink(from, to);
            default:
                throw Failed("rename to", to);
        }
    }

    private static int RenameInOneStep(string from, string to)
    {
        try
        {
            var outcome = LinuxCalls.Rename(LinuxCalls.CurrentFolder, from, LinuxCalls.CurrentFolder, to, LinuxCalls.NoReplace);
            return outcome == 0 ? 0 : Marshal.GetLastPInvokeError();
        }
        catch (EntryPointNotFoundException)
        {
            return Errno.NoSystemCall;
        }
    }

    // For file systems that cannot rename without overwriting. A kill between the two calls leaves both names, the content whole under each.
    internal static bool RenameByLink(string from, string to)
    {
        if (LinuxCalls.Link(from, to) != 0)
        {
            return Marshal.GetLastPInvokeError() == Errno.Exists ? false : throw Failed("link to", to);
        }

        File.Delete(from);
        return true;
    }

    private static bool RenameElsewhere(string from, string to)
    {
        try
        {
            File.Move(from, to, overwrite: false);
            return true;
        }
        catch (IOException) when (File.Exists(to) && File.Exists(from))
        {
            return false;
        }
    }

    private static IOException Failed(string what, string path) => new($"could not {what} {path}: {Marshal.GetLastPInvokeErrorMessage()}");
}
