using LoadWatch.Decoding;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;

namespace LoadWatch.Service.Arrivals;

/// <summary>Reads contents of known arrivals back from the archive.</summary>
public sealed class ArchiveReader(Store store, Archive archive, DecoderSet decoders)
{
    /// <summary>The content of an archive object and of the arrivals inside it that are kept nowhere else.</summary>
    public IEnumerable<SeenContent> Contents(string objectSha)
    {
        var path = store.Read(session => session.Sightings.Of(objectSha))[0].Path;
        return ArchivedContents(objectSha, path).Select(content => new SeenContent(content, null));
    }

    private IEnumerable<ArrivalContent> ArchivedContents(string objectSha, string path) =>
        ArrivalContent.Expand(decoders, objectSha, path, archive.Read(objectSha))
            .Where(content => KeptIn(content.Sha) is not { } kept || kept == objectSha);

    private string? KeptIn(string sha) => store.Read(session => session.Arrivals.Get(sha))?.ObjectSha;
}
