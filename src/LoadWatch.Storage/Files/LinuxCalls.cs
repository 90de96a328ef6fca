using System.Globalization;
using System.Runtime.InteropServices;
using Microsoft.Win32.SafeHandles;

namespace LoadWatch.Storage.Files;

/// <summary>The system calls that .NET does not offer. Each returns -1 on error, with errno as the last P/Invoke error.</summary>
internal static partial class LinuxCalls
{
    public const int CurrentFolder = -100;
    public const int CloseOnExec = 0x80000;
    public const int NonBlocking = 0x800;
    public const uint NoReplace = 1;
    public const int EmptyPath = 0x1000;
    public const int NoFollowAt = 0x100;

    /// <summary>To list a folder and go into it: R_OK and X_OK.</summary>
    public const int ToEnter = 4 | 1;

    /// <summary>SYNC_FILE_RANGE_WRITE.</summary>
    public const uint StartWriting = 2;

    /// <summary>Type, mode, size, times, inode: STATX_BASIC_STATS.</summary>
    public const uint BasicStats = 0x7ff;

    /// <summary>These, and the time of birth: STATX_BASIC_STATS and STATX_BTIME.</summary>
    public const uint StatsWithBirth = 0xfff;

    // The two flags differ between the generic and the ARM ABI.
    public static readonly int OnlyFolder = OnArm ? 0x4000 : 0x10000;
    public static readonly int NoFollow = OnArm ? 0x8000 : 0x20000;

    private static bool OnArm => RuntimeInformation.ProcessArchitecture is Architecture.Arm64 or Architecture.Arm;

    [LibraryImport("libc", EntryPoint = "open", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    public static partial int Open(string path, int flags);

    [LibraryImport("libc", EntryPoint = "access", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    public static partial int Access(string path, int mode);

    [LibraryImport("libc", EntryPoint = "close", SetLastError = true)]
    public static partial int Close(int descriptor);

    [LibraryImport("libc", EntryPoint = "fsync", SetLastError = true)]
    public static partial int Sync(int descriptor);

    [LibraryImport("libc", EntryPoint = "sync_file_range", SetLastError = true)]
    public static partial int SyncRange(SafeFileHandle file, long offset, long bytes, uint flags);

    [LibraryImport("libc", EntryPoint = "statx", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    public static partial int Stat(int folder, string path, int flags, uint mask, out FileStatus status);

    /// <param name="path">The first byte of the path, which ends with 0.</param>
    [LibraryImport("libc", EntryPoint = "statx", SetLastError = true)]
    public static partial int Stat(int folder, ref byte path, int flags, uint mask, out FileStatus status);

    [LibraryImport("libc", EntryPoint = "statfs", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    public static partial int FileSystem(string path, out FileSystemStatus status);

    [LibraryImport("libc", EntryPoint = "renameat2", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    public static partial int Rename(int fromFolder, string from, int toFolder, string to, uint flags);

    [LibraryImport("libc", EntryPoint = "link", SetLastError = true, StringMarshalling = StringMarshalling.Utf8)]
    public static partial int Link(string from, string to);

    [LibraryImport("libc", EntryPoint = "umask")]
    public static partial uint Umask(uint mask);
}

/// <summary>The kernel's <c>struct statx</c>, the same on every architecture.</summary>
[StructLayout(LayoutKind.Explicit, Size = 256)]
internal struct FileStatus
{
    private const int TypeMask = 0xF000;
    private const int RegularType = 0x8000;
    private const int FolderType = 0x4000;
    private const uint Born = 0x800;

    [FieldOffset(0)]
    public uint Mask;

    [FieldOffset(28)]
    public ushort Mode;

    [FieldOffset(32)]
    public ulong Inode;

    [FieldOffset(40)]
    public ulong Size;

    [FieldOffset(80)]
    public long BornSeconds;

    [FieldOffset(88)]
    public uint BornNanoseconds;

    [FieldOffset(112)]
    public long ModifiedSeconds;

    [FieldOffset(120)]
    public uint ModifiedNanoseconds;

    [FieldOffset(136)]
    public uint DeviceMajor;

    [FieldOffset(140)]
    public uint DeviceMinor;

    public readonly bool IsRegular => (Mode & TypeMask) == RegularType;

    public readonly bool IsFolder => (Mode & TypeMask) == FolderType;

    public readonly string Id => string.Create(CultureInfo.InvariantCulture, $"{DeviceMajor}.{DeviceMinor}:{Inode}");

    /// <summary>With the time of birth, where the file system keeps it: the number of a deleted folder is soon given to the next.</summary>
    public readonly string IdWithBirth => (Mask & Born) == 0 ? Id : FormattableString.Invariant($"{Id}@{BornSeconds}.{BornNanoseconds:D9}");

    public readonly FileStamp Stamp => new((long)Size, (ModifiedSeconds * 1000) + (ModifiedNanoseconds / 1_000_000), Id);
}

/// <summary>The beginning of <c>struct statfs</c>, with more room than any architecture needs.</summary>
[StructLayout(LayoutKind.Sequential, Size = 512)]
internal struct FileSystemStatus
{
    public nint Type;
}

/// <summary>The numbers of errno that decide something; the same on every Linux architecture.</summary>
internal static class Errno
{
    public const int NotPermitted = 1;
    public const int NoEntry = 2;
    public const int Interrupted = 4;
    public const int NoDevice = 6;
    public const int WouldBlock = 11;
    public const int AccessDenied = 13;
    public const int Exists = 17;
    public const int NotAFolder = 20;
    public const int Invalid = 22;
    public const int NoSpace = 28;
    public const int ReadOnly = 30;
    public const int NoSystemCall = 38;
    public const int Loop = 40;
    public const int NotSupported = 95;
    public const int NoQuota = 122;
}
