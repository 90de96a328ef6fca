using System.Runtime.InteropServices;

namespace LoadWatch.Service.Tests.Endurance;

/// <summary>What the C library's allocator has given out in this process, over all its arenas.</summary>
internal static class NativeHeap
{
    /// <summary>Null where the C library has no such count: other than glibc 2.33 and later.</summary>
    public static long? Bytes()
    {
        try
        {
            var counts = Mallinfo2();
            return checked((long)(counts.InUse + counts.Mapped));
        }
        catch (Exception error) when (error is DllNotFoundException or EntryPointNotFoundException)
        {
            return null;
        }
    }

    [DllImport("libc", EntryPoint = "mallinfo2")]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern Counts Mallinfo2();

    /// <summary>As malloc.h of glibc lays it out.</summary>
    [StructLayout(LayoutKind.Sequential)]
    private readonly struct Counts
    {
        private readonly nuint arena, ordinaryBlocks, fastBlocks, mappedBlocks;
        public readonly nuint Mapped;
        private readonly nuint unused, fastFree;
        public readonly nuint InUse;
        private readonly nuint free, top;
    }
}
