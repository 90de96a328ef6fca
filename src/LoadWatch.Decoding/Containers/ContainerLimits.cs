namespace LoadWatch.Decoding.Containers;

/// <summary>How much a container may hold (I-11). Whatever is beyond a limit is refused before it is unpacked that far.</summary>
public sealed record ContainerLimits
{
    /// <summary>Bytes that one member unpacks to. Default 32 MB.</summary>
    public int MemberBytes { get; init; } = 32 << 20;

    /// <summary>Bytes that all members of one container unpack to. Default 200 MB.</summary>
    public long TotalBytes { get; init; } = 200L << 20;

    /// <summary>Entries of a zip file, folders among them. Default 10,000.</summary>
    public int Entries { get; init; } = 10_000;

    /// <summary>Unpacked over packed size: of a member of a zip file, of a gzip file as a whole. Default 200.</summary>
    public int Ratio { get; init; } = 200;

    /// <summary>What unpacks to no more than this many bytes may have any ratio. Default 1 MB.</summary>
    public int RatioFreeBytes { get; init; } = 1 << 20;

    /// <summary>The limits where the largest file taken is another than 32 MB: a member may be as large as a file, and so may a container of one.</summary>
    public static ContainerLimits For(long largestFileBytes)
    {
        var usual = new ContainerLimits();
        return usual with { MemberBytes = checked((int)largestFileBytes), TotalBytes = Math.Max(usual.TotalBytes, largestFileBytes) };
    }

    internal bool IsBomb(long unpacked, long packed) => unpacked > RatioFreeBytes && unpacked > packed * Ratio;
}
