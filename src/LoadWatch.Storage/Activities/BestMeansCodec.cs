using System.Buffers.Binary;
using LoadWatch.Capacity;

namespace LoadWatch.Storage.Activities;

/// <summary>Best means as bytes: eight for each duration from the shortest on, a binary64 number, lowest byte first.</summary>
public static class BestMeansCodec
{
    public static byte[] Write(BestMeans means)
    {
        ArgumentNullException.ThrowIfNull(means);
        var bytes = new byte[means.Values.Count * sizeof(double)];
        for (var at = 0; at < means.Values.Count; at++)
        {
            BinaryPrimitives.WriteDoubleLittleEndian(bytes.AsSpan(at * sizeof(double)), means.Values[at]);
        }

        return bytes;
    }

    /// <exception cref="InvalidDataException">The bytes were not written by <see cref="Write"/>.</exception>
    public static BestMeans Read(ReadOnlySpan<byte> bytes)
    {
        var values = new double[bytes.Length / sizeof(double)];
        for (var at = 0; at < values.Length; at++)
        {
            values[at] = BinaryPrimitives.ReadDoubleLittleEndian(bytes[(at * sizeof(double))..]);
        }

        return bytes.Length % sizeof(double) == 0 && values.Length <= BestMeans.Durations.Count && Array.TrueForAll(values, double.IsFinite)
            ? new BestMeans(values)
            : throw new InvalidDataException("no best means: their bytes are damaged");
    }
}
