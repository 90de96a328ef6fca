namespace LoadWatch.Storage.Archives;

/// <summary>A file could not be read to its end: trouble of that file, not of the archive.</summary>
public sealed class SourceUnreadableException(IOException cause) : IOException(cause.Message, cause);
