using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Storage.Recordings;

/// <summary>A name under which a content was seen.</summary>
/// <param name="Inbox">Name of the inbox.</param>
/// <param name="Path">Within the inbox; a member of an archive file is <c>outer.zip!/inner.fit</c>, with the stamp of the outer file.</param>
/// <param name="FirstSeen">When this content was first seen under this name.</param>
/// <param name="Latest">Whether this is the newest content of the name.</param>
/// <param name="Since">Since when it is, or when it last became it.</param>
public sealed record Sighting(string Inbox, string Path, string Sha, Instant FirstSeen, FileStamp Stamp, bool Latest, Instant Since);
