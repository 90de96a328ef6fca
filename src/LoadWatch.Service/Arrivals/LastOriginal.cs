using LoadWatch.Storage.Archives;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// The original that was read last, kept only as long as memory is not wanted for anything else: the members of a zip file are wanted one after the other.
/// Safe to use from several threads.
/// </summary>
public sealed class LastOriginal(Archive archive)
{
    private volatile Kept? last;

    /// <inheritdoc cref="Archive.ReadWhole"/>
    public byte[]? ReadWhole(string sha)
    {
        if (last is { } kept && kept.Sha == sha && kept.Bytes.TryGetTarget(out var bytes))
        {
            return bytes;
        }

        var read = archive.ReadWhole(sha);
        last = read is null ? last : new Kept(sha, new WeakReference<byte[]>(read));
        return read;
    }

    private sealed record Kept(string Sha, WeakReference<byte[]> Bytes);
}
