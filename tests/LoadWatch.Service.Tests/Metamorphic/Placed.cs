using LoadWatch.Decoding;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Metamorphic;

/// <summary>A file at a place of the inbox.</summary>
/// <param name="Night">The night in which it comes, 0 the first.</param>
internal sealed record Placed(string Path, byte[] Bytes, int Night = 0)
{
    private static readonly DecoderSet Decoders = new([]);

    /// <summary>The smallest name of each content that is no archive, by its hash: what is shown (I-5).</summary>
    public static IReadOnlyDictionary<string, string> SmallestNames(IEnumerable<Placed> files) => files
        .SelectMany(file => ArrivalContent.Expand(Decoders, WorkingFolder.Sha(file.Bytes), file.Path, file.Bytes))
        .Where(content => content.Kind is not (ContentKind.Gzip or ContentKind.Zip))
        .GroupBy(content => content.Sha, content => content.Path, StringComparer.Ordinal)
        .ToDictionary(same => same.Key, same => same.Min(StringComparer.Ordinal)!, StringComparer.Ordinal);
}
