namespace LoadWatch.Decoding;

/// <summary>What a content is by its bytes; its name plays no part.</summary>
public enum ContentKind
{
    /// <summary>None of the others.</summary>
    Unknown,

    /// <summary>A FIT file.</summary>
    Fit,

    /// <summary>A gzip file: one content, packed.</summary>
    Gzip,

    /// <summary>A zip file: several contents, packed.</summary>
    Zip,

    /// <summary>Text, to be read as CSV.</summary>
    Text,
}

/// <summary>Whether a content shows by itself that all of it is there.</summary>
public enum Completeness
{
    /// <summary>It is whole: take it at once.</summary>
    Complete,

    /// <summary>It cannot tell, or it is cut or damaged: wait until its size and time have stood still.</summary>
    NeedsSettling,
}
