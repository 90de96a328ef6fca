using LoadWatch.Service.Arrivals;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <param name="Origin">The file that it came in, or null where nothing new was seen.</param>
public sealed record SeenContent(ArrivalContent Content, Origin? Origin);

/// <summary>A file of an inbox as the sightings of what is inside it name it.</summary>
/// <param name="Inbox">Name of the inbox.</param>
public sealed record Origin(string Inbox, Instant FirstSeen, FileStamp Stamp);
