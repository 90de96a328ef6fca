namespace LoadWatch.Storage.Files;

/// <summary>What tells that a file is still the one that was read. A cache only: any change means that it is hashed again.</summary>
/// <param name="Size">Bytes.</param>
/// <param name="ModifiedUnixMs">Milliseconds since 1970-01-01T00:00:00Z.</param>
/// <param name="FileId"><c>device:inode</c>; where the system tells neither, the time of creation.</param>
public sealed record FileStamp(long Size, long ModifiedUnixMs, string FileId);
