using System.Security.Cryptography;
using LoadWatch.Decoding;
using LoadWatch.Decoding.Containers;
using LoadWatch.Recordings;

namespace LoadWatch.Service.Arrivals;

/// <summary>One content on its way through the pipeline: a file, or a member of an archive file with the file it came in.</summary>
/// <param name="Sha">SHA-256 of the content itself.</param>
/// <param name="ParentSha">The archive file around it, or null.</param>
/// <param name="Path">Where it was seen, inside archives as <c>outer.zip!/inner.fit</c>.</param>
/// <param name="Bytes">Empty where <see cref="Open"/> gives them.</param>
/// <param name="Members">Files in this content that could be unpacked, where it is an archive.</param>
/// <param name="Problems">What went wrong with the others.</param>
public sealed record ArrivalContent(
    string Sha, string? ParentSha, string Path, ContentKind Kind, ReadOnlyMemory<byte> Bytes, int Members, IReadOnlyList<Problem> Problems)
{
    /// <summary>Opens a text that is too large to be held, at its start; null for every other content.</summary>
    public Func<Stream>? Open { get; init; }

    /// <summary>Bytes.</summary>
    public long Size { get; init; } = Bytes.Length;

    /// <summary>The content and, for an archive, its members, each an arrival of its own; the archive comes last, when its members are known.</summary>
    public static IEnumerable<ArrivalContent> Expand(DecoderSet decoders, string sha, string path, ReadOnlyMemory<byte> bytes) =>
        Expand(decoders, sha, null, path, bytes, 0);

    /// <summary>The same of one member of a file in an inbox; nothing where the member could not be unpacked.</summary>
    /// <param name="parent">SHA-256 of the file.</param>
    /// <param name="path">Where the file was seen.</param>
    public static IEnumerable<ArrivalContent> ExpandMember(DecoderSet decoders, string parent, string path, ContainerMember member) =>
        member.Problem is null ? ExpandMember(decoders, parent, path, member, depth: 1) : [];

    private static IEnumerable<ArrivalContent> Expand(
        DecoderSet decoders, string sha, string? parent, string path, ReadOnlyMemory<byte> bytes, int depth)
    {
        var kind = DecoderSet.Recognise(bytes.Span);
        if (kind is not (ContentKind.Gzip or ContentKind.Zip))
        {
            yield return new ArrivalContent(sha, parent, path, kind, bytes, 0, []);
            yield break;
        }

        if (DecoderSet.CheckNesting(kind, depth) is { } tooDeep)
        {
            yield return new ArrivalContent(sha, parent, path, kind, bytes, 0, [tooDeep]);
            yield break;
        }

        var unpacked = decoders.Unpack(bytes, path[(path.LastIndexOf('/') + 1)..]);
        var problems = unpacked.Problems.ToList();
        var members = 0;
        foreach (var member in unpacked.Members)
        {
            if (member.Problem is { } problem)
            {
                problems.Add(problem);
                continue;
            }

            members++;
            foreach (var content in ExpandMember(decoders, parent ?? sha, path, member, depth + 1))
            {
                yield return content;
            }
        }

        yield return new ArrivalContent(sha, parent, path, kind, bytes, members, problems);
    }

    private static IEnumerable<ArrivalContent> ExpandMember(DecoderSet decoders, string parent, string path, ContainerMember member, int depth) =>
        Expand(decoders, Convert.ToHexStringLower(SHA256.HashData(member.Bytes.Span)), parent, $"{path}{Attribution.Inside}{member.Name}", member.Bytes, depth);
}
