using System.Globalization;
using System.Runtime.InteropServices;
using System.Text;
using Microsoft.Win32.SafeHandles;

namespace LoadWatch.Storage.Files;

/// <summary>Opens what strangers put into a folder: never waits, never follows a link, takes regular files only.</summary>
public static class SafeFile
{
    private const int LongestPathBytes = 1024;

    /// <summary>Opens a file for reading. No problem of the file is thrown; all are answers.</summary>
    public static FileOpening Open(string path) => OperatingSystem.IsLinux() ? OpenOnLinux(path) : OpenElsewhere(path);

    /// <summary>The same once more for a file that is read several times, at its start.</summary>
    /// <exception cref="IOException">It cannot be opened any more.</exception>
    public static FileStream Reopen(string path) => Open(path) switch
    {
        OpenedFile opened => opened.Stream,
        UnopenedFile unopened => throw new IOException(unopened.Reason),
        _ => throw new InvalidOperationException("a file is opened or not"),
    };

    /// <inheritdoc cref="StampOf(string)"/>
    /// <remarks>For paths of which there are very many: on Linux none becomes a string.</remarks>
    public static FileStamp? StampOf(ReadOnlySpan<char> path)
    {
        if (!OperatingSystem.IsLinux())
        {
            return StampOf(path.ToString());
        }

        Span<byte> bytes = stackalloc byte[LongestPathBytes];
        if (!Encoding.UTF8.TryGetBytes(path, bytes[..^1], out var length))
        {
            return StampOf(path.ToString());
        }

        bytes[length] = 0;
        return LinuxCalls.Stat(LinuxCalls.CurrentFolder, ref MemoryMarshal.GetReference(bytes), LinuxCalls.NoFollowAt, LinuxCalls.BasicStats, out var status) == 0
            && status.IsRegular ? status.Stamp : null;
    }

    /// <summary>The stamp of a regular file, links not followed; null where there is none.</summary>
    public static FileStamp? StampOf(string path)
    {
        if (!OperatingSystem.IsLinux())
        {
            return IsRegularElsewhere(path) ? StampElsewhere(path) : null;
        }

        return StatusOf(path) is { IsRegular: true } status ? status.Stamp : null;
    }

    /// <summary>False for a folder that may not be listed or whose files may not be reached.</summary>
    public static bool MayEnter(string folder) =>
        !OperatingSystem.IsLinux() || LinuxCalls.Access(folder, LinuxCalls.ToEnter) == 0 || Marshal.GetLastPInvokeError() is not (Errno.AccessDenied or Errno.NotPermitted);

    /// <summary>
    /// The identity of a folder, null where there is none. It changes when the folder is made anew or something is mounted over it,
    /// which sends no event. A link is followed: an inbox may be named by one.
    /// </summary>
    public static string? FolderId(string path)
    {
        if (!OperatingSystem.IsLinux())
        {
            return Directory.Exists(path) ? CreationText(Directory.GetCreationTimeUtc(path)) : null;
        }

        return LinuxCalls.Stat(LinuxCalls.CurrentFolder, path, 0, LinuxCalls.StatsWithBirth, out var status) == 0 && status.IsFolder ? status.IdWithBirth : null;
    }

    private static FileStatus? StatusOf(string path) =>
        LinuxCalls.Stat(LinuxCalls.CurrentFolder, path, LinuxCalls.NoFollowAt, LinuxCalls.BasicStats, out var status) == 0 ? status : null;

    // Opening a pipe would wait for a writer: non-blocking, and asked what it is before anything is read.
    private static FileOpening OpenOnLinux(string path)
    {
        var descriptor = LinuxCalls.Open(path, LinuxCalls.NoFollow | LinuxCalls.NonBlocking | LinuxCalls.CloseOnExec);
        if (descriptor < 0)
        {
            return Unopened(Marshal.GetLastPInvokeError());
        }

        var handle = new SafeFileHandle(descriptor, ownsHandle: true);
        if (LinuxCalls.Stat(descriptor, "", LinuxCalls.EmptyPath, LinuxCalls.BasicStats, out var status) != 0)
        {
            var error = Marshal.GetLastPInvokeError();
            handle.Dispose();
            return Unopened(error);
        }

        if (!status.IsRegular)
        {
            handle.Dispose();
            return NotRegular();
        }

        return new OpenedFile(new FileStream(handle, FileAccess.Read, bufferSize: 0), status.Stamp);
    }

    private static UnopenedFile Unopened(int error) => error switch
    {
        Errno.NoEntry or Errno.NotAFolder => new UnopenedFile(FileTrouble.Missing, "no such file"),
        Errno.Loop or Errno.NoDevice => NotRegular(),
        Errno.AccessDenied or Errno.NotPermitted => new UnopenedFile(FileTrouble.Denied, "no right to read it"),
        _ => new UnopenedFile(FileTrouble.Failed, Marshal.GetPInvokeErrorMessage(error)),
    };

    private static UnopenedFile NotRegular() => new(FileTrouble.NotRegular, "not a regular file");

    private static FileOpening OpenElsewhere(string path)
    {
        try
        {
            if (!Path.Exists(path))
            {
                return Unopened(Errno.NoEntry);
            }

            if (!IsRegularElsewhere(path))
            {
                return NotRegular();
            }

            var stream = new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete, bufferSize: 0);
            return new OpenedFile(stream, StampElsewhere(path));
        }
        catch (UnauthorizedAccessException)
        {
            return Unopened(Errno.AccessDenied);
        }
        catch (IOException exception)
        {
            return new UnopenedFile(FileTrouble.Failed, exception.Message);
        }
    }

    private static bool IsRegularElsewhere(string path)
    {
        const FileAttributes others = FileAttributes.ReparsePoint | FileAttributes.Device | FileAttributes.Directory;
        return File.Exists(path) && (File.GetAttributes(path) & others) == FileAttributes.None;
    }

    private static FileStamp StampElsewhere(string path)
    {
        var file = new FileInfo(path);
        var modified = new DateTimeOffset(file.LastWriteTimeUtc, TimeSpan.Zero).ToUnixTimeMilliseconds();
        return new FileStamp(file.Length, modified, CreationText(file.CreationTimeUtc));
    }

    private static string CreationText(DateTime created) => created.Ticks.ToString(CultureInfo.InvariantCulture);
}
