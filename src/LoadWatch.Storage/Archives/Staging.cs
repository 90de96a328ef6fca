using LoadWatch.Storage.Files;

namespace LoadWatch.Storage.Archives;

/// <summary>What came of copying into the archive: a <see cref="StagedCopy"/> or <see cref="OverLimit"/>.</summary>
public abstract record Staging;

/// <summary>A copy without its final name yet. Whoever has it gives its memory back when nobody reads the content any more.</summary>
public sealed record StagedCopy : Staging, IDisposable
{
    private readonly RentedBytes bytes;
    private readonly FileStream file;

    internal StagedCopy(string sha, string temporaryPath, long size, RentedBytes bytes, FileStream file)
    {
        Sha = sha;
        TemporaryPath = temporaryPath;
        this.bytes = bytes;
        this.file = file;
        Size = size;
    }

    /// <summary>SHA-256 of the content, 64 lower-case hex digits.</summary>
    public string Sha { get; }

    public string TemporaryPath { get; }

    /// <summary>Bytes.</summary>
    public long Size { get; }

    /// <summary>The content, so that nobody reads it a second time; empty where it was not to be held.</summary>
    /// <exception cref="ObjectDisposedException">Its memory is given back.</exception>
    public ReadOnlyMemory<byte> Bytes => bytes.Memory;

    public void Dispose()
    {
        file.Dispose();
        bytes.Dispose();
    }

    /// <summary>Waits until the copy is on the disk, through the handle by which it was written: an error of the disk shows there.</summary>
    internal void Sync()
    {
        DurableFile.Sync(file);
        file.Dispose();
    }
}

/// <summary>The source holds more than the limit; nothing of it was kept.</summary>
public sealed record OverLimit(long LimitBytes) : Staging;
