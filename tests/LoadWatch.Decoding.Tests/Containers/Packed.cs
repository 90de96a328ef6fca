using System.Buffers.Binary;
using System.IO.Compression;
using System.Text;

namespace LoadWatch.Decoding.Tests.Containers;

/// <summary>Makes containers, whole or with a fault.</summary>
internal static class Packed
{
    public static byte[] Ride { get; } = Encoding.UTF8.GetBytes("time,power_w\n" + string.Concat(Enumerable.Range(0, 2000).Select(i => $"{i},{i * i % 977}\n")));

    public static byte[] Gzip(byte[] content, CompressionLevel level = CompressionLevel.Optimal)
    {
        if (content.Length == 0)
        {
            // The platform writes nothing at all for nothing; a member without content is a header, an empty block, and zeros (RFC 1952).
            return [0x1F, 0x8B, 8, 0, 0, 0, 0, 0, 0, 3, 3, 0, 0, 0, 0, 0, 0, 0, 0, 0];
        }

        var stream = new MemoryStream();
        using (var gzip = new GZipStream(stream, level))
        {
            gzip.Write(content);
        }

        return stream.ToArray();
    }

    public static byte[] Zip(params (string Name, byte[] Content)[] members) => Zip(CompressionLevel.Optimal, members);

    public static byte[] Zip(CompressionLevel level, params (string Name, byte[] Content)[] members) => Zip(level, names: null, members);

    /// <param name="level">How the members are packed.</param>
    /// <param name="names">The encoding of names; only UTF-8 is stated in the file. Null: UTF-8 where a name is not ASCII.</param>
    /// <param name="members">In order.</param>
    public static byte[] Zip(CompressionLevel level, Encoding? names, params (string Name, byte[] Content)[] members)
    {
        var stream = new MemoryStream();
        using (var zip = new ZipArchive(stream, ZipArchiveMode.Create, leaveOpen: true, names))
        {
            foreach (var (name, content) in members)
            {
                using var entry = zip.CreateEntry(name, level).Open();
                entry.Write(content);
            }
        }

        return stream.ToArray();
    }

    /// <summary>Changes a field of the first entry of the central directory, and where given the same field of its local header.</summary>
    public static byte[] WithField(byte[] zip, int directoryOffset, int? localOffset, uint value, int width)
    {
        var changed = (byte[])zip.Clone();
        Write(changed, changed.AsSpan().IndexOf("PK\x1\x2"u8) + directoryOffset, value, width);
        if (localOffset is { } local)
        {
            Write(changed, local, value, width);
        }

        return changed;
    }

    /// <summary>Adds an extra field to the only entry of the directory.</summary>
    public static byte[] WithExtra(byte[] zip, byte[] extra)
    {
        var directory = zip.AsSpan().IndexOf("PK\x1\x2"u8);
        var end = zip.AsSpan().IndexOf("PK\x5\x6"u8);
        byte[] longer = [.. zip[..end], .. extra, .. zip[end..]];
        Write(longer, directory + 30, (uint)extra.Length, 2);
        Write(longer, end + extra.Length + 12, (uint)(end + extra.Length - directory), 4);
        return longer;
    }

    public static byte[] Flipped(byte[] bytes, int at)
    {
        var changed = (byte[])bytes.Clone();
        changed[at] ^= 0x10;
        return changed;
    }

    private static void Write(byte[] bytes, int at, uint value, int width)
    {
        if (width == 2)
        {
            BinaryPrimitives.WriteUInt16LittleEndian(bytes.AsSpan(at), (ushort)value);
        }
        else
        {
            BinaryPrimitives.WriteUInt32LittleEndian(bytes.AsSpan(at), value);
        }
    }
}
