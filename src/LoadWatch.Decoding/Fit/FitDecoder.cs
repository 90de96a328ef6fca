using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

public enum FitCompleteness
{
    Complete,
    Suspect,
}

/// <summary>Stand-in with the names of the FIT decoder: it knows the signature only.</summary>
public static class FitDecoder
{
    public static bool LooksLikeFit(ReadOnlySpan<byte> head) => head.Length >= 12 && head.Slice(8, 4).SequenceEqual(".FIT"u8);

    public static FitCompleteness CheckCompleteness(ReadOnlySpan<byte> bytes) =>
        LooksLikeFit(bytes) && bytes.Length >= 14 ? FitCompleteness.Complete : FitCompleteness.Suspect;

    public static DecodedFile Decode(ReadOnlyMemory<byte> bytes) =>
        new("fit", FileType: null, SourceName: null, [], [new Problem(ProblemSeverity.Error, "FIT is not decoded here", ByteOffset: bytes.Length)]);
}
