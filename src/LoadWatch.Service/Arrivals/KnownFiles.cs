using System.Buffers.Binary;
using System.Runtime.InteropServices;
using System.Security.Cryptography;
using LoadWatch.Storage;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Which files were taken as they stand now. A cache only: whatever it does not know is read and hashed again, which changes nothing (I-1). It keeps a
/// fingerprint of each name and of its stamp, some 40 bytes a file, and is told of a file only when that is durable. Not for two threads at once.
/// </summary>
public sealed class KnownFiles
{
    private readonly Dictionary<string, Dictionary<UInt128, ulong>> inboxes = new(StringComparer.Ordinal);

    /// <summary>The files of an inbox; read from the store at the first call.</summary>
    public KnownInbox Of(string inbox, Store store)
    {
        if (!inboxes.TryGetValue(inbox, out var files))
        {
            files = inboxes[inbox] = store.Read(session => Read(session, inbox));
        }

        return new KnownInbox(files);
    }

    public void Add(FoundFile file, FileStamp stamp)
    {
        if (inboxes.TryGetValue(file.Inbox.Name, out var files))
        {
            files[NameOf(file.Path)] = StampOf(stamp);
        }
    }

    /// <summary>The store no longer says that this name was seen.</summary>
    public void Forget(string inbox, string path)
    {
        if (inboxes.TryGetValue(inbox, out var files))
        {
            files.Remove(NameOf(path));
        }
    }

    private static Dictionary<UInt128, ulong> Read(StoreSession session, string inbox)
    {
        var files = new Dictionary<UInt128, ulong>(session.Sightings.CountLatest(inbox));
        session.Sightings.EachLatest(inbox, (path, stamp) => files[NameOf(path)] = StampOf(stamp));
        return files;
    }

    internal static UInt128 NameOf(ReadOnlySpan<char> path)
    {
        Span<byte> hash = stackalloc byte[SHA256.HashSizeInBytes];
        SHA256.HashData(MemoryMarshal.AsBytes(path), hash);
        return BinaryPrimitives.ReadUInt128LittleEndian(hash);
    }

    internal static ulong StampOf(FileStamp stamp)
    {
        Span<byte> hash = stackalloc byte[SHA256.HashSizeInBytes];
        Span<byte> bytes = stackalloc byte[2 * sizeof(long) + 256];
        BinaryPrimitives.WriteInt64LittleEndian(bytes, stamp.Size);
        BinaryPrimitives.WriteInt64LittleEndian(bytes[sizeof(long)..], stamp.ModifiedUnixMs);
        var length = 2 * sizeof(long) + System.Text.Encoding.UTF8.GetBytes(stamp.FileId, bytes[(2 * sizeof(long))..]);
        SHA256.HashData(bytes[..length], hash);
        return BinaryPrimitives.ReadUInt64LittleEndian(hash);
    }
}

/// <summary>The known files of one inbox.</summary>
public readonly struct KnownInbox
{
    private readonly Dictionary<UInt128, ulong> files;

    internal KnownInbox(Dictionary<UInt128, ulong> files) => this.files = files;

    /// <param name="path">Below the inbox, <c>/</c> between folders.</param>
    public bool Has(ReadOnlySpan<char> path, FileStamp stamp) => files.TryGetValue(KnownFiles.NameOf(path), out var known) && known == KnownFiles.StampOf(stamp);
}
