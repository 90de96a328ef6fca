using System.Numerics;

namespace LoadWatch.Activities;

/// <summary>
/// A digest that takes 64 bits at a time: d = (rotate(d, 31) xor w) times an odd constant. The constant is 2^64 over the golden ratio, as in Knuth's
/// multiplicative hashing (The Art of Computer Programming, volume 3, section 6.4); the rest is a choice. Columns run in four lanes side by side, so that
/// no multiplication waits for the one before.
/// </summary>
internal readonly record struct WordDigest(ulong State)
{
    private const ulong Factor = 0x9E3779B97F4A7C15;
    private const int Lanes = 4;

    /// <summary>The digest of all that was added.</summary>
    public long Value => unchecked((long)(State ^ (State >> 32)));

    public WordDigest Add(long word) => new(Mix(State, unchecked((ulong)word)));

    /// <summary>Every NaN counts as the same, and so do both zeros.</summary>
    public WordDigest Add(double value) => new(Mix(State, Bits(value)));

    public WordDigest Add(string word) => word.Aggregate(Add((long)word.Length), (digest, letter) => digest.Add((long)letter));

    public WordDigest Add(ReadOnlySpan<long> column)
    {
        var (a, b, c, d, at) = (State, 1UL, 2UL, 3UL, 0);
        for (; at <= column.Length - Lanes; at += Lanes)
        {
            a = Mix(a, unchecked((ulong)column[at]));
            b = Mix(b, unchecked((ulong)column[at + 1]));
            c = Mix(c, unchecked((ulong)column[at + 2]));
            d = Mix(d, unchecked((ulong)column[at + 3]));
        }

        var digest = Joined(a, b, c, d);
        for (; at < column.Length; at++)
        {
            digest = digest.Add(column[at]);
        }

        return digest.Add((long)column.Length);
    }

    /// <summary>As single values are taken.</summary>
    public WordDigest Add(ReadOnlySpan<double> column)
    {
        var (a, b, c, d, at) = (State, 1UL, 2UL, 3UL, 0);
        for (; at <= column.Length - Lanes; at += Lanes)
        {
            a = Mix(a, Bits(column[at]));
            b = Mix(b, Bits(column[at + 1]));
            c = Mix(c, Bits(column[at + 2]));
            d = Mix(d, Bits(column[at + 3]));
        }

        var digest = Joined(a, b, c, d);
        for (; at < column.Length; at++)
        {
            digest = digest.Add(column[at]);
        }

        return digest.Add((long)column.Length);
    }

    private static WordDigest Joined(ulong a, ulong b, ulong c, ulong d) => new(Mix(Mix(Mix(a, b), c), d));

    private static ulong Bits(double value) => BitConverter.DoubleToUInt64Bits(double.IsNaN(value) ? double.NaN : value + 0.0);

    private static ulong Mix(ulong state, ulong word) => unchecked((BitOperations.RotateLeft(state, 31) ^ word) * Factor);
}
