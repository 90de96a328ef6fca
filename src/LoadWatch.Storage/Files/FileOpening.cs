namespace LoadWatch.Storage.Files;

/// <summary>What came of opening a file: an <see cref="OpenedFile"/> or an <see cref="UnopenedFile"/>.</summary>
public abstract record FileOpening;

/// <summary>A regular file, open for reading. The stamp was taken from the open file, so it belongs to what is read.</summary>
public sealed record OpenedFile(FileStream Stream, FileStamp Stamp) : FileOpening, IDisposable
{
    public void Dispose() => Stream.Dispose();
}

/// <param name="Reason">In plain words, without the path.</param>
public sealed record UnopenedFile(FileTrouble Trouble, string Reason) : FileOpening;

/// <summary>Why a file could not be opened.</summary>
public enum FileTrouble
{
    /// <summary>Gone, or its name holds bytes that are not UTF-8.</summary>
    Missing,

    /// <summary>A folder, link, pipe, socket or device.</summary>
    NotRegular,

    Denied,

    /// <summary>Anything else the system says: worth another try.</summary>
    Failed,
}
