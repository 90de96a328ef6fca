// Steele, Lea and Flood 2014, Fast splittable pseudorandom number generators (SplitMix64); normal values by Box and Muller 1958.
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Simulation.Worlds;

/// <summary>Numbers that look like chance and are the same for the same seed on every machine.</summary>
public sealed class Chance
{
    private readonly ulong origin;
    private ulong state;

    /// <param name="seed">Of the whole simulation.</param>
    /// <param name="stream">Tells one group's chance from another's.</param>
    public Chance(int seed, string stream)
        : this(unchecked((ulong)seed * 0x9E3779B97F4A7C15UL), stream)
    {
    }

    /// <summary>What is drawn from one stream moves no other: neither another person's, nor another aspect of the same, nor another date.</summary>
    private Chance(ulong from, string stream)
    {
        state = from;
        foreach (var letter in stream)
        {
            state ^= letter;
            state = Next();
        }

        origin = state;
    }

    /// <summary>The same for the same name, however much has been drawn from this one.</summary>
    public Chance Stream(string name) => new(origin, $"/{name}");

    public Chance Stream(string aspect, LocalDate date) => Stream($"{aspect} {LocalDatePattern.Iso.Format(date)}");

    /// <summary>From 0 up to, not including, 1.</summary>
    public double Share() => (Next() >> 11) * (1.0 / (1UL << 53));

    public bool Happens(double probability) => Share() < probability;

    /// <summary>From 0 up to, not including, the bound.</summary>
    public int Below(int bound) => (int)(Share() * bound);

    /// <summary>Both ends included.</summary>
    public int Between(int lowest, int highest) => lowest + Below(highest - lowest + 1);

    public double Normal() => Math.Sqrt(-2 * Math.Log(1 - Share())) * Math.Cos(2 * Math.PI * Share());

    /// <summary>Log-normal with a mean of 1.</summary>
    /// <param name="deviation">Standard deviation of the logarithm.</param>
    public double Factor(double deviation) => Math.Exp((deviation * Normal()) - (deviation * deviation / 2));

    public T OneOf<T>(IReadOnlyList<T> choices) => choices[Below(choices.Count)];

    private ulong Next()
    {
        unchecked
        {
            state += 0x9E3779B97F4A7C15UL;
            var mixed = (state ^ (state >> 30)) * 0xBF58476D1CE4E5B9UL;
            mixed = (mixed ^ (mixed >> 27)) * 0x94D049BB133111EBUL;
            return mixed ^ (mixed >> 31);
        }
    }
}
