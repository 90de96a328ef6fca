using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// A stable 64-bit digest of what a recording measured: times, columns, beats of their own, sets. FNV-1a with 64 bits
/// (Fowler, Noll and Vo; their published offset basis and prime), over little-endian bytes. It tells copies apart from neighbours; it is
/// no protection against forgery.
/// </summary>
public static class SamplesDigest
{
    private const ulong Basis = 14695981039346656037;
    private const ulong Prime = 1099511628211;

    public static long Of(Recording recording)
    {
        var digest = Basis;
        digest = OfSamples(digest, recording.Samples);
        foreach (var beat in recording.LateHeartRates)
        {
            digest = Add(Add(digest, beat.UnixMilliseconds), beat.BeatsPerMinute);
        }

        foreach (var set in recording.Sets)
        {
            digest = OfSet(digest, set);
        }

        return unchecked((long)digest);
    }

    private static ulong OfSamples(ulong digest, SampleSeries samples)
    {
        foreach (var time in samples.UnixMilliseconds)
        {
            digest = Add(digest, time);
        }

        foreach (var channel in samples.Channels)
        {
            digest = Add(digest, (long)channel);
            foreach (var value in samples[channel])
            {
                digest = Add(digest, value);
            }
        }

        return digest;
    }

    private static ulong OfSet(ulong digest, StrengthSet set)
    {
        digest = Add(digest, set.Start?.ToUnixTimeMilliseconds() ?? SampleSeries.Undated);
        digest = Add(digest, set.DurationSeconds ?? double.NaN);
        digest = Add(digest, set.Active ? 1L : 0L);
        digest = Add(digest, set.Exercise ?? "");
        digest = Add(digest, set.Repetitions ?? double.NaN);
        digest = Add(digest, set.Kilograms ?? double.NaN);
        digest = Add(digest, set.RepetitionsInReserve ?? double.NaN);
        return OfSetLog(digest, set);
    }

    /// <summary>What only set logs say, each behind its own number and only where it is said: sets of devices keep the digest that they had before.</summary>
    private static ulong OfSetLog(ulong digest, StrengthSet set)
    {
        digest = set.Machine is null ? digest : Add(Add(digest, 1L), set.Machine);
        digest = set.Hardness is { } hardness ? Add(Add(digest, 2L), hardness) : digest;
        digest = set.Load == SetLoad.Weight ? digest : Add(Add(digest, 3L), (long)set.Load);
        digest = set.Pin is { } pin ? Add(Add(digest, 4L), pin) : digest;
        digest = set.IsHold ? Add(digest, 5L) : digest;
        digest = set.IsFast ? Add(digest, 6L) : digest;
        return set.ConcentricSeconds is { } seconds ? Add(Add(digest, 7L), seconds) : digest;
    }

    private static ulong Add(ulong digest, string word) => word.Aggregate(digest, (sum, letter) => Add(sum, (long)letter));

    /// <summary>Every NaN counts as the same, and so do both zeros.</summary>
    private static ulong Add(ulong digest, double value) =>
        Add(digest, BitConverter.DoubleToInt64Bits(double.IsNaN(value) ? double.NaN : value + 0.0));

    private static ulong Add(ulong digest, long value)
    {
        unchecked
        {
            for (var shift = 0; shift < 64; shift += 8)
            {
                digest = (digest ^ (byte)(value >> shift)) * Prime;
            }

            return digest;
        }
    }
}
