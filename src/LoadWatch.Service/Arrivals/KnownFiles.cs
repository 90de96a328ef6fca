using System.Buffers.Binary;
using System.Collections.Concurrent;
using System.Runtime.InteropServices;
using System.Security.Cryptography;
using LoadWatch.Storage;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Which files were taken as they stand now. A cache only: whatever it does not know is read and hashed again, which changes nothing (I-1). It keeps a
/// fingerprint of each name and of its stamp, some 40 bytes a file, and is told of a file only when that is durable. Safe to use from several threads.
/// </summary>
public sealed class KnownFiles
{
    private readonly ConcurrentDictionary<string, Lazy<KnownInbox>> inboxes = new(StringComparer.Ordinal);

    /// <summary>The files of an inbox; read from the store at the first call.</summary>
    public KnownInbox Of(string inbox, Store store) =>
        inboxes.GetOrAdd(inbox, name => new Lazy<KnownInbox>(() => store.Read(session => Read(session, name)), LazyThreadSafetyMode.PublicationOnly)).Value;

    public void Add(FoundFile file, FileStamp stamp) => Read(file.Inbox.Name)?.Add(file.Path, stamp);

    /// <summary>The store no longer says that this name was seen.</summary>
    public void Forget(string inbox, string path) => Read(inbox)?.Forget(path);

    /// <summary>Null where it was not asked for yet: it will be read with all that is durable by then.</summary>
    private KnownInbox? Read(string inbox) => inboxes.TryGetValue(inbox, out var files) && files.IsValueCreated ? files.Value : null;

    private static KnownInbox Read(StoreSession session, string inbox)
    {
        var files = new KnownInbox(session.Sightings.CountLatest(inbox));
        session.Sightings.EachLatest(inbox, (path, stamp) => files.Add(path, stamp));
        return files;
    }
}

/// <summary>The known files of one inbox. Safe to use from several threads.</summary>
public sealed class KnownInbox(int expected = 0)
{
    private readonly Lock guard = new();
    private readonly Dictionary<UInt128, ulong> files = new(expected);

    public int Count
    {
        get
        {
            lock (guard)
            {
                return files.Count;
            }
        }
    }

    /// <param name="path">Below the inbox, <c>/</c> between folders.</param>
    public bool Has(ReadOnlySpan<char> path, FileStamp stamp)
    {
        var (name, wanted) = (NameOf(path), StampOf(stamp));
        lock (guard)
        {
            return files.TryGetValue(name, out var known) && known == wanted;
        }
    }

    internal void Add(ReadOnlySpan<char> path, FileStamp stamp)
    {
        var (name, known) = (NameOf(path), StampOf(stamp));
        lock (guard)
        {
            files[name] = known;
        }
    }

    internal void Forget(ReadOnlySpan<char> path)
    {
        var name = NameOf(path);
        lock (guard)
        {
            files.Remove(name);
        }
    }

    private static UInt128 NameOf(ReadOnlySpan<char> path)
    {
        Span<byte> hash = stackalloc byte[SHA256.HashSizeInBytes];
        SHA256.HashData(MemoryMarshal.AsBytes(path), hash);
        return BinaryPrimitives.ReadUInt128LittleEndian(hash);
    }

    private static ulong StampOf(FileStamp stamp)
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
