using System.Globalization;
using System.Text;
using LoadWatch.Storage.Files;

namespace LoadWatch.Storage;

/// <summary>Held by the one process that may take in files and evaluate. The system frees it when the process ends, however it ends.</summary>
public sealed class InstanceLock : IDisposable
{
    private const int SharingViolation = unchecked((int)0x80070020);

    private readonly FileStream file;

    private InstanceLock(FileStream file) => this.file = file;

    /// <summary>Takes the lock, then removes copies that a killed run left half-written: only the holder knows that nobody writes them.</summary>
    /// <exception cref="InstanceRunningException">Another process holds it.</exception>
    public static InstanceLock Take(DataFolder folder)
    {
        var taken = new InstanceLock(OpenAlone(folder.LockPath));
        taken.WriteProcessId();
        foreach (var leftOver in Directory.EnumerateFiles(folder.IncomingPath))
        {
            File.Delete(leftOver);
        }

        return taken;
    }

    public void Dispose()
    {
        file.SetLength(0);
        file.Dispose();
    }

    private static FileStream OpenAlone(string path)
    {
        try
        {
            // Windows would keep the holder's number from being read with None; Read keeps writers out all the same.
            return PrivateFiles.OpenOrCreate(path, OperatingSystem.IsWindows() ? FileShare.Read : FileShare.None);
        }
        catch (IOException e) when (IsHeld(e))
        {
            throw new InstanceRunningException(path, ReadProcessId(path));
        }
    }

    /// <summary>A disk that is full or fails is no other process. EWOULDBLOCK of the lock, or the sharing violation of Windows.</summary>
    internal static bool IsHeld(IOException error) => error.HResult == (OperatingSystem.IsWindows() ? SharingViolation : Errno.WouldBlock);

    private static int? ReadProcessId(string path)
    {
        if (SafeFile.Open(path) is not OpenedFile opened)
        {
            return null;
        }

        using var reader = new StreamReader(opened.Stream, Encoding.ASCII);
        return int.TryParse(reader.ReadToEnd(), NumberStyles.None, CultureInfo.InvariantCulture, out var id) ? id : null;
    }

    private void WriteProcessId()
    {
        file.SetLength(0);
        file.Write(Encoding.ASCII.GetBytes(Environment.ProcessId.ToString(CultureInfo.InvariantCulture)));
        file.Flush();
    }
}

/// <summary>Another process holds the lock of the data folder.</summary>
/// <param name="processId">Of the holder, or null where it could not be read.</param>
public sealed class InstanceRunningException(string lockPath, int? processId)
    : Exception($"another LoadWatch is at work on this data folder: process {Text(processId)} holds {lockPath}")
{
    public string LockPath => lockPath;

    public int? ProcessId => processId;

    private static string Text(int? processId) => processId?.ToString(CultureInfo.InvariantCulture) ?? "of unknown number";
}
