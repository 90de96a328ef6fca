using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>
/// Chance that can be repeated: SplitMix64 (Steele, Lea and Flood 2014, "Fast splittable pseudorandom number generators"), started from words, so that
/// every person and session has a stream of its own and no other session moves it. Only + - x / and square roots: the same numbers on every machine.
/// </summary>
internal sealed class DemoRandom
{
    private const ulong Golden = 0x9E3779B97F4A7C15;
    private const double RootOfThree = 1.7320508075688772;

    private ulong state;

    private DemoRandom(ulong state) => this.state = state;

    /// <param name="seed">Of the whole demo.</param>
    /// <param name="words">What the stream is for.</param>
    public static DemoRandom For(int seed, params ReadOnlySpan<string> words) => new(Hash(unchecked((ulong)seed * Golden), words));

    /// <summary>The stream of one session.</summary>
    public static DemoRandom For(int seed, string person, LocalDateTime start) =>
        For(seed, person, start.ToString("uuuu-MM-dd HH:mm", System.Globalization.CultureInfo.InvariantCulture));

    /// <summary>At least <paramref name="least"/>, below <paramref name="most"/>.</summary>
    public double Between(double least, double most) => least + ((most - least) * ((Next() >> 11) * (1.0 / (1UL << 53))));

    /// <summary>Both bounds included.</summary>
    public int Whole(int least, int most) => least + (int)(Next() % (ulong)(most - least + 1));

    /// <summary>
    /// Mean 0, standard deviation 1, within 3.5: the sum of four even numbers of 16 bits, which is close to a normal one and needs no logarithm.
    /// </summary>
    public double Normal()
    {
        var bits = Next();
        var sum = (bits & 0xFFFF) + ((bits >> 16) & 0xFFFF) + ((bits >> 32) & 0xFFFF) + (bits >> 48);
        return ((sum / 65536.0) - 2) * RootOfThree;
    }

    /// <summary>A factor around 1 with this standard deviation, never further from 1 than twice that.</summary>
    public double Factor(double deviation) => 1 + Math.Clamp(deviation * Normal(), -2 * deviation, 2 * deviation);

    private ulong Next() => unchecked(Mix(state += Golden));

    private static ulong Mix(ulong value)
    {
        var mixed = Mixed(Mixed(value, 30, 0xBF58476D1CE4E5B9), 27, 0x94D049BB133111EB);
        return mixed ^ (mixed >> 31);
    }

    private static ulong Mixed(ulong value, int shift, ulong factor) => unchecked((value ^ (value >> shift)) * factor);

    /// <summary>FNV-1a over the characters, a bar between words.</summary>
    private static ulong Hash(ulong start, ReadOnlySpan<string> words)
    {
        var hash = 0xCBF29CE484222325 ^ start;
        foreach (var word in words)
        {
            foreach (var letter in word)
                hash = unchecked((hash ^ letter) * 0x100000001B3);

            hash = unchecked((hash ^ '|') * 0x100000001B3);
        }

        return Mix(hash);
    }
}
