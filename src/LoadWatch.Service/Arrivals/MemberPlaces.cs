using System.Collections.Concurrent;
using LoadWatch.Decoding;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Finds contents in zip files. Where each lies is learnt when the first of a zip file is wanted; then each is unpacked alone, not with all before
/// it. Safe to use from several threads.
/// </summary>
public sealed class MemberPlaces(DecoderSet decoders)
{
    private const int ContainersKept = 64;

    private readonly ConcurrentDictionary<string, IReadOnlyDictionary<string, int>> known = new(StringComparer.Ordinal);

    /// <summary>The content of a hash in an original, or the original itself; null where it holds none such.</summary>
    /// <param name="objectSha">Of the original.</param>
    /// <param name="path">Where the original was seen.</param>
    public ArrivalContent? Find(string objectSha, string path, ReadOnlyMemory<byte> original, string sha)
    {
        if (sha == objectSha || DecoderSet.Recognise(original.Span) != ContentKind.Zip)
        {
            return ArrivalContent.Expand(decoders, objectSha, path, original).FirstOrDefault(content => content.Sha == sha);
        }

        if (known.Count >= ContainersKept && !known.ContainsKey(objectSha))
        {
            known.Clear();
        }

        return known.GetOrAdd(objectSha, _ => PlacesIn(original)).TryGetValue(sha, out var place)
            ? ArrivalContent.ExpandMember(decoders, objectSha, path, decoders.Unpack(original, path).Members[place]).FirstOrDefault(content => content.Sha == sha)
            : null;
    }

    private Dictionary<string, int> PlacesIn(ReadOnlyMemory<byte> original)
    {
        var places = new Dictionary<string, int>(StringComparer.Ordinal);
        var place = 0;
        foreach (var member in decoders.Unpack(original, "").Members)
        {
            foreach (var content in ArrivalContent.ExpandMember(decoders, "", "", member))
            {
                places.TryAdd(content.Sha, place);
            }

            place++;
        }

        return places;
    }
}
