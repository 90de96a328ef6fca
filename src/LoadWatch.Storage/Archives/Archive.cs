using System.Globalization;
using System.Security.Cryptography;
using LoadWatch.Storage.Files;

namespace LoadWatch.Storage.Archives;

/// <summary>
/// The originals, each named by its content. The order of I-2 is kept here: write the copy, sync it, rename it without overwriting, sync the folder.
/// </summary>
public sealed class Archive(DataFolder folder)
{
    private const int BufferBytes = 128 * 1024;
    private static int counter;

    /// <summary>
    /// Reads the source once: hashes it and writes a copy, which is on its way to the disk when this returns. It becomes durable and gets its name by
    /// <see cref="Commit"/>.
    /// </summary>
    /// <param name="limitBytes">The most that is taken; at most 2 GB where the bytes are held.</param>
    /// <param name="isHeld">Whether the bytes are kept in memory, so that nobody reads them a second time.</param>
    /// <exception cref="SourceUnreadableException">The source failed; nothing is left behind.</exception>
    /// <exception cref="IOException">The disk failed; nothing is left behind.</exception>
    public Staging Stage(Stream source, long limitBytes, bool isHeld = true, CancellationToken cancel = default)
    {
        var temporary = TemporaryPath();
        var copy = PrivateFiles.CreateOnce(temporary);
        var bytes = new RentedBytes(isHeld ? ExpectedBytes(source, limitBytes) : BufferBytes);
        try
        {
            if (CopyTo(copy, bytes, source, limitBytes, isHeld, cancel) is not var (sha, size))
            {
                Drop(copy, bytes, temporary);
                return new OverLimit(limitBytes);
            }

            DurableFile.BeginSync(copy);
            return new StagedCopy(sha, temporary, size, bytes, copy);
        }
        catch
        {
            Drop(copy, bytes, temporary);
            throw;
        }
    }

    /// <summary>
    /// Makes the copies durable, gives them their names and makes those durable, each folder once. All copies are on their way to the disk before the first is
    /// waited for, so that a journalling file system writes its journal once for many. A copy of what is here already is deleted.
    /// </summary>
    public void Commit(IReadOnlyList<StagedCopy> copies)
    {
        foreach (var copy in copies)
        {
            copy.Sync();
        }

        foreach (var copy in copies)
        {
            Place(copy);
            KillPoint.Pass("placed");
        }

        // Also where the object was here before: the run that placed it may have died before this line.
        foreach (var objectFolder in copies.Select(copy => folder.ObjectFolder(copy.Sha)).Distinct(StringComparer.Ordinal))
        {
            DurableFile.SyncFolder(objectFolder);
        }
    }

    /// <summary>Deletes a copy that is not wanted after all, and gives its memory back.</summary>
    public static void Discard(StagedCopy copy)
    {
        copy.Dispose();
        File.Delete(copy.TemporaryPath);
    }

    public bool Exists(string sha) => File.Exists(PathOf(sha));

    /// <exception cref="FileNotFoundException">There is no such object.</exception>
    public FileStream Open(string sha) => new FileStream(PathOf(sha), FileMode.Open, FileAccess.Read, FileShare.Read);

    /// <inheritdoc cref="Open"/>
    public byte[] Read(string sha) => File.ReadAllBytes(PathOf(sha));

    /// <summary>Bytes of the object; null where there is none.</summary>
    public long? SizeOf(string sha) => new FileInfo(PathOf(sha)) is { Exists: true } file ? file.Length : null;

    /// <summary>The object, read once; null where it is missing, cannot be read or no longer has the content it is named by.</summary>
    public byte[]? ReadWhole(string sha)
    {
        try
        {
            var bytes = Read(sha);
            return string.Equals(Convert.ToHexStringLower(SHA256.HashData(bytes)), sha, StringComparison.Ordinal) ? bytes : null;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    /// <summary>Whether the object is here and still has the content it is named by.</summary>
    public bool Verify(string sha)
    {
        if (!Exists(sha))
        {
            return false;
        }

        using var stream = Open(sha);
        return string.Equals(Convert.ToHexStringLower(SHA256.HashData(stream)), sha, StringComparison.Ordinal);
    }

    /// <summary>Where the object lies, or would lie.</summary>
    public string PathOf(string sha)
    {
        if (sha.Length != 64 || !sha.All(char.IsAsciiHexDigitLower))
        {
            throw new ArgumentException("not the 64 lower-case hex digits of a SHA-256", nameof(sha));
        }

        return Path.Combine(folder.ObjectFolder(sha), sha);
    }

    private string TemporaryPath()
    {
        var number = Interlocked.Increment(ref counter);
        return Path.Combine(folder.IncomingPath, string.Create(CultureInfo.InvariantCulture, $"{Environment.ProcessId}-{number}.part"));
    }

    /// <returns>The SHA-256 of what was copied and its bytes, or null where it is more than the limit.</returns>
    private static (string Sha, long Size)? CopyTo(FileStream copy, RentedBytes bytes, Stream source, long limitBytes, bool isHeld, CancellationToken cancel)
    {
        long size = 0;
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        for (var read = ReadSource(source, bytes.Free(BufferBytes)); read > 0; read = ReadSource(source, bytes.Free(BufferBytes)))
        {
            cancel.ThrowIfCancellationRequested();
            size += read;
            if (size > limitBytes)
            {
                return null;
            }

            var piece = bytes.Took(read);
            hash.AppendData(piece);
            copy.Write(piece);
            if (!isHeld)
            {
                bytes.Forget();
            }
        }

        return (Convert.ToHexStringLower(hash.GetHashAndReset()), size);
    }

    private static int ReadSource(Stream source, Span<byte> buffer)
    {
        try
        {
            return source.Read(buffer);
        }
        catch (IOException error)
        {
            throw new SourceUnreadableException(error);
        }
    }

    private static int ExpectedBytes(Stream source, long limitBytes) =>
        source.CanSeek ? (int)Math.Min(source.Length - source.Position, limitBytes) : BufferBytes;

    private static void Drop(FileStream copy, RentedBytes bytes, string path)
    {
        copy.Dispose();
        bytes.Dispose();
        File.Delete(path);
    }

    private void Place(StagedCopy copy)
    {
        if (DurableFile.RenameWithoutOverwrite(copy.TemporaryPath, PathOf(copy.Sha)))
        {
            return;
        }

        if (Verify(copy.Sha))
        {
            File.Delete(copy.TemporaryPath);
        }
        else
        {
            // The object has rotted on the disk and here is a whole one.
            File.Move(copy.TemporaryPath, PathOf(copy.Sha), overwrite: true);
        }
    }
}
