using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Reads what lies before the end of a part that was cut off or never closed. What it gives is true: it refuses where the bytes do not show that they only
/// end too early, since a wrong byte anywhere would make wrong values of those behind it.
/// </summary>
internal static class FitSalvage
{
    private const long LongestStep = 24 * 3600 * 1000L;
    private static ReadOnlySpan<byte> Mark => ".FIT"u8;

    /// <summary>Whether the part only ends too early; then <paramref name="reader"/> holds what came before.</summary>
    /// <param name="bytes">The whole file.</param>
    public static bool Read(FitPartReader reader, FitFrame frame, ReadOnlySpan<byte> bytes)
    {
        var isCut = frame.End > bytes.Length || frame.IsUnclosed(bytes);
        if (!isCut || !frame.HasSoundHeader(bytes) || frame.DataStart >= bytes.Length)
            return false;

        var data = Data(frame, bytes);
        return data.IndexOf(Mark) < 0
            && (reader.Read(data, frame.DataStart) is null || reader.RanOut)
            && reader.Content.HasTraining
            && IsSteady(reader.Content.Samples);
    }

    /// <summary>
    /// The last two bytes may be a checksum where the size does not tell: they are left, whatever the header. Taken for data they could end a message with a
    /// wrong value; left they cost no more than the last message.
    /// </summary>
    private static ReadOnlySpan<byte> Data(FitFrame frame, ReadOnlySpan<byte> bytes)
    {
        var data = bytes[frame.DataStart..];
        return frame.IsUnclosed(bytes)
            ? data[..Math.Max(0, data.Length - FitFrame.CrcSize)]
            : data[..(int)Math.Min(data.Length, frame.DataEnd - frame.DataStart)];
    }

    /// <summary>Whether time runs forward, and never by more than a day: bytes that are missing in the middle show in it.</summary>
    private static bool IsSteady(SampleColumns samples)
    {
        var before = SampleSeries.Undated;
        for (var row = 0; row < samples.Count; row++)
        {
            var time = samples.Times[row];
            if (time == SampleSeries.Undated)
                continue;

            if (before != SampleSeries.Undated && (time < before || time - before > LongestStep))
                return false;

            before = time;
        }

        return true;
    }
}
