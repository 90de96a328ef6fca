using System.Runtime.InteropServices;
using System.Runtime.Versioning;

namespace LoadWatch.Service.Configuration;

/// <summary>A generic credential of the Windows Credential Manager, which keeps it for the account that this process runs under.</summary>
[SupportedOSPlatform("windows")]
internal static class WindowsCredential
{
    private const int Generic = 1;

    /// <summary>The secret, which is stored as UTF-16; null where the account has no such credential or may not read it.</summary>
    public static string? Read(string name)
    {
        if (!CredRead(name, Generic, 0, out var found))
        {
            return null;
        }

        try
        {
            var credential = Marshal.PtrToStructure<Credential>(found);
            return Marshal.PtrToStringUni(credential.Blob, credential.BlobBytes / sizeof(char));
        }
        finally
        {
            CredFree(found);
        }
    }

    [DllImport("advapi32.dll", EntryPoint = "CredReadW", CharSet = CharSet.Unicode, SetLastError = true)]
    [DefaultDllImportSearchPaths(DllImportSearchPath.System32)]
    [return: MarshalAs(UnmanagedType.Bool)]
    private static extern bool CredRead(string target, int type, int flags, out IntPtr credential);

    [DllImport("advapi32.dll", EntryPoint = "CredFree")]
    [DefaultDllImportSearchPaths(DllImportSearchPath.System32)]
    private static extern void CredFree(IntPtr credential);

    /// <summary>CREDENTIALW of wincred.h, in its order.</summary>
    [StructLayout(LayoutKind.Sequential)]
    private struct Credential
    {
        public int Flags;
        public int Type;
        public IntPtr TargetName;
        public IntPtr Comment;
        public int LastWrittenLow;
        public int LastWrittenHigh;
        public int BlobBytes;
        public IntPtr Blob;
        public int Persist;
        public int AttributeCount;
        public IntPtr Attributes;
        public IntPtr TargetAlias;
        public IntPtr UserName;
    }
}
