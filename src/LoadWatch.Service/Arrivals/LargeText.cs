using LoadWatch.Decoding;
using LoadWatch.Storage.Archives;

namespace LoadWatch.Service.Arrivals;

/// <summary>Text that is too large to be held: it is read as a stream from where it lies, as often as it is wanted (I-11).</summary>
public static class LargeText
{
    /// <summary>Text of more bytes is not held; what lies in a container never comes here.</summary>
    public const long HeldBytes = 32L * 1024 * 1024;

    public static bool Is(ContentKind? kind, long size) => kind == ContentKind.Text && size > HeldBytes;

    /// <summary>An original that is such a text; null where it is none, or is missing.</summary>
    /// <exception cref="IOException">It cannot be read.</exception>
    public static ArrivalContent? In(Archive archive, string sha, string path)
    {
        if (archive.SizeOf(sha) is not { } size || size <= HeldBytes)
        {
            return null;
        }

        using var stream = archive.Open(sha);
        return Is(KindOf(stream), size) ? Of(sha, path, size, () => archive.Open(sha)) : null;
    }

    /// <param name="open">Opens it at its start.</param>
    public static ArrivalContent Of(string sha, string path, long size, Func<Stream> open) =>
        new(sha, null, path, ContentKind.Text, ReadOnlyMemory<byte>.Empty, 0, []) { Open = open, Size = size };

    /// <summary>What a file is by its first bytes; it stands at its start again.</summary>
    /// <exception cref="IOException">It cannot be read.</exception>
    public static ContentKind KindOf(FileStream stream)
    {
        var head = new byte[DecoderSet.HeadLength];
        var length = stream.ReadAtLeast(head, head.Length, throwOnEndOfStream: false);
        stream.Position = 0;
        return DecoderSet.Recognise(head.AsSpan(0, length));
    }
}
