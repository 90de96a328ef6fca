using LoadWatch.Recordings;

namespace LoadWatch.Storage.Recordings;

/// <summary>One content that came in.</summary>
/// <param name="Sha">SHA-256, 64 lower-case hex digits.</param>
/// <param name="ParentSha">The archive file of which it is a member, or null.</param>
/// <param name="ObjectSha">The object of the archive that holds its bytes: its own, or its parent's.</param>
/// <param name="Kind">What it was found to be, in a word; null before it was decoded.</param>
/// <param name="Reason">Why it is aside, held or refused; null otherwise.</param>
/// <param name="Person">Id of the owner, or null.</param>
/// <param name="Attempts">How often decoding it brought its process down (I-4).</param>
/// <param name="Size">Bytes.</param>
public sealed record Arrival(
    string Sha,
    string? ParentSha,
    string ObjectSha,
    string? Kind,
    ArrivalState State,
    string? Reason,
    string? Person,
    int Attempts,
    long Size);
