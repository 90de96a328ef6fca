using System.Runtime.InteropServices;
using System.Text.Unicode;

namespace LoadWatch.Decoding.Csv;

/// <summary>The bytes of a text, read from their start as often as wanted; those of a file are never held whole.</summary>
internal sealed class CsvSource(Func<Stream> open)
{
    private const int HeadLength = 3;
    private const int BufferBytes = 64 * 1024;

    private readonly Lazy<byte[]> head = new(() => HeadOf(open));
    private readonly Lazy<long> length = new(() => LengthOf(open));
    private readonly Lazy<bool> isUtf8 = new(() => IsValid(open));

    public static CsvSource Of(ReadOnlyMemory<byte> bytes) => new(() => AsStream(bytes));

    /// <summary>The first bytes, in which a byte order mark would stand.</summary>
    public ReadOnlySpan<byte> Head => head.Value;

    /// <summary>Whether all of it is valid UTF-8. The first to ask reads all of it.</summary>
    public bool IsUtf8 => isUtf8.Value;

    /// <summary>Bytes of all of it.</summary>
    public long Length => length.Value;

    /// <param name="skipped">Bytes of the start that are left out.</param>
    public Stream Open(int skipped)
    {
        var stream = open();
        stream.Position += skipped;
        return stream;
    }

    private static byte[] HeadOf(Func<Stream> open)
    {
        using var stream = open();
        var bytes = new byte[HeadLength];
        return bytes[..stream.ReadAtLeast(bytes, HeadLength, throwOnEndOfStream: false)];
    }

    private static long LengthOf(Func<Stream> open)
    {
        using var stream = open();
        return stream.Length;
    }

    private static bool IsValid(Func<Stream> open)
    {
        using var stream = open();
        var buffer = new byte[BufferBytes];
        var held = 0;
        while (stream.Read(buffer, held, buffer.Length - held) is > 0 and var count)
        {
            var filled = held + count;
            held = UnfinishedTail(buffer.AsSpan(0, filled));
            if (!Utf8.IsValid(buffer.AsSpan(0, filled - held)))
            {
                return false;
            }

            buffer.AsSpan(filled - held, held).CopyTo(buffer);
        }

        return held == 0;
    }

    /// <summary>How many bytes at the end begin a character whose other bytes are still to come.</summary>
    private static int UnfinishedTail(ReadOnlySpan<byte> bytes)
    {
        for (var taken = 1; taken <= Math.Min(3, bytes.Length); taken++)
        {
            var first = bytes[^taken];
            if ((first & 0xC0) != 0x80)
            {
                var wanted = first switch { >= 0xF0 => 4, >= 0xE0 => 3, >= 0xC0 => 2, _ => 1 };
                return wanted > taken ? taken : 0;
            }
        }

        return 0;
    }

    private static MemoryStream AsStream(ReadOnlyMemory<byte> bytes) => MemoryMarshal.TryGetArray(bytes, out var segment)
        ? new MemoryStream(segment.Array!, segment.Offset, segment.Count, writable: false)
        : new MemoryStream(bytes.ToArray(), writable: false);
}
