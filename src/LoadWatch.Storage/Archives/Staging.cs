namespace LoadWatch.Storage.Archives;

/// <summary>What came of copying into the archive: a <see cref="StagedCopy"/> or <see cref="OverLimit"/>.</summary>
public abstract record Staging;

/// <summary>A durable copy without its final name yet.</summary>
/// <param name="Sha">SHA-256 of the content, 64 lower-case hex digits.</param>
/// <param name="Bytes">The content, so that nobody reads it a second time.</param>
public sealed record StagedCopy(string Sha, ReadOnlyMemory<byte> Bytes, string TemporaryPath) : Staging
{
    /// <summary>Bytes.</summary>
    public long Size => Bytes.Length;
}

/// <summary>The source holds more than the limit; nothing of it was kept.</summary>
public sealed record OverLimit(long LimitBytes) : Staging;
