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

    /// <summary>Reads the source once: hashes it, writes a copy and makes the copy durable. It gets its name by <see cref="Commit"/>.</summary>
    /// <param name="limitBytes">The most that is taken; at most 2 GB, since the bytes are kept in memory.</param>
    /// <exception cref="SourceUnreadableException">The source failed; nothing is left behind.</exception>
    /// <exception cref="IOException">The disk failed; nothing is left behind.</exception>
    public Staging Stage(Stream source, long limitBytes, CancellationToken cancel = default)
    {
        var temporary = TemporaryPath();
        try
        {
            var staged = CopyTo(temporary, source, limitBytes, cancel);
            if (staged is OverLimit)
            {
                File.Delete(temporary);
            }

            return staged;
        }
        catch
        {
            File.Delete(temporary);
            throw;
        }
    }

    /// <summary>Gives the copies their names and makes those durable, each folder once. A copy of what is here already is deleted.</summary>
    public void Commit(IReadOnlyList<StagedCopy> copies)
    {
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

    /// <summary>Deletes a copy that is not wanted after all.</summary>
    public static void Discard(StagedCopy copy) => File.Delete(copy.TemporaryPath);

    public bool Exists(string sha) => File.Exists(PathOf(sha));

    /// <exception cref="FileNotFoundException">There is no such object.</exception>
    public Stream Open(string sha) => new FileStream(PathOf(sha), FileMode.Open, FileAccess.Read, FileShare.Read);

    /// <inheritdoc cref="Open"/>
    public byte[] Read(string sha) => File.ReadAllBytes(PathOf(sha));

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

    private static Staging CopyTo(string path, Stream source, long limitBytes, CancellationToken cancel)
    {
        using var copy = PrivateFiles.CreateOnce(path);
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        using var kept = new MemoryStream(ExpectedBytes(source, limitBytes));
        var buffer = new byte[BufferBytes];
        for (var read = ReadSource(source, buffer); read > 0; read = ReadSource(source, buffer))
        {
            cancel.ThrowIfCancellationRequested();
            if (kept.Length + read > limitBytes)
            {
                return new OverLimit(limitBytes);
            }

            var piece = buffer.AsSpan(0, read);
            hash.AppendData(piece);
            copy.Write(piece);
            kept.Write(piece);
        }

        DurableFile.Sync(copy);
        return new StagedCopy(Convert.ToHexStringLower(hash.GetHashAndReset()), kept.GetBuffer().AsMemory(0, (int)kept.Length), path);
    }

    private static int ReadSource(Stream source, byte[] buffer)
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

    private void Place(StagedCopy copy)
    {
        if (DurableFile.RenameWithoutOverwrite(copy.TemporaryPath, PathOf(copy.Sha)))
        {
            return;
        }

        if (Verify(copy.Sha))
        {
            Discard(copy);
        }
        else
        {
            // The object has rotted on the disk and here is a whole one.
            File.Move(copy.TemporaryPath, PathOf(copy.Sha), overwrite: true);
        }
    }
}
