using LoadWatch.Decoding;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Arrivals;

/// <summary>Reads contents of known arrivals back from the archive, each original once: it is hashed as it is read.</summary>
public sealed class ArchiveReader(Store store, Archive archive, DecoderSet decoders)
{
    /// <summary>
    /// The content of an archive object and of everything inside it, for each name under which the object was seen; null where the original is missing or
    /// damaged.
    /// </summary>
    public IEnumerable<SeenContent>? Sighted(string objectSha) => Expansion(objectSha) is { } expand
        ? SightingsOf(objectSha).SelectMany(sighting => expand(sighting.Path)
            .Select(content => new SeenContent(content, new Origin(sighting.Inbox, sighting.FirstSeen, sighting.Stamp))))
        : null;

    /// <summary>The content of an archive object and of the arrivals inside it that are kept nowhere else; null where the original is missing or damaged.</summary>
    public IEnumerable<SeenContent>? Kept(string objectSha) => Expansion(objectSha) is { } expand
        ? expand(SightingsOf(objectSha)[0].Path)
            .Where(content => KeptIn(content.Sha) is not { } kept || kept == objectSha)
            .Select(content => new SeenContent(content, null))
        : null;

    private IReadOnlyList<Sighting> SightingsOf(string sha) => store.Read(session => session.Sightings.Of(sha));

    /// <summary>Gives the contents under a path; null where the original is missing or damaged.</summary>
    private Func<string, IEnumerable<ArrivalContent>>? Expansion(string objectSha)
    {
        try
        {
            if (LargeText.In(archive, objectSha, "") is { } large)
            {
                return archive.Verify(objectSha) ? path => [large with { Path = path }] : null;
            }
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }

        return archive.ReadWhole(objectSha) is { } bytes ? path => ArrivalContent.Expand(decoders, objectSha, path, bytes) : null;
    }

    private string? KeptIn(string sha) => store.Read(session => session.Arrivals.Get(sha))?.ObjectSha;
}
