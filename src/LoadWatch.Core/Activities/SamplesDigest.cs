using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// A stable 64-bit digest of what a recording measured: times, columns, beats of their own, sets. It tells copies apart from neighbours; it is
/// no protection against forgery.
/// </summary>
public static class SamplesDigest
{
    public static long Of(Recording recording)
    {
        var digest = OfSamples(new WordDigest(), recording.Samples);
        foreach (var beat in recording.LateHeartRates)
        {
            digest = digest.Add(beat.UnixMilliseconds).Add(beat.BeatsPerMinute);
        }

        foreach (var set in recording.Sets)
        {
            digest = OfSet(digest, set);
        }

        return digest.Value;
    }

    private static WordDigest OfSamples(WordDigest digest, SampleSeries samples)
    {
        digest = digest.Add(samples.UnixMilliseconds);
        foreach (var channel in samples.Channels)
        {
            digest = digest.Add((long)channel).Add(samples[channel]);
        }

        return digest;
    }

    private static WordDigest OfSet(WordDigest digest, StrengthSet set) => OfSetLog(
        digest
            .Add(set.Start?.ToUnixTimeMilliseconds() ?? SampleSeries.Undated)
            .Add(set.DurationSeconds ?? double.NaN)
            .Add(set.Active ? 1L : 0L)
            .Add(set.Exercise ?? "")
            .Add(set.Repetitions ?? double.NaN)
            .Add(set.Kilograms ?? double.NaN)
            .Add(set.RepetitionsInReserve ?? double.NaN),
        set);

    /// <summary>What only set logs say, each behind its own number and only where it is said.</summary>
    private static WordDigest OfSetLog(WordDigest digest, StrengthSet set)
    {
        digest = set.Machine is null ? digest : digest.Add(1L).Add(set.Machine);
        digest = set.Hardness is { } hardness ? digest.Add(2L).Add(hardness) : digest;
        digest = set.Load == SetLoad.Weight ? digest : digest.Add(3L).Add((long)set.Load);
        digest = set.Pin is { } pin ? digest.Add(4L).Add(pin) : digest;
        digest = set.IsHold ? digest.Add(5L) : digest;
        digest = set.IsFast ? digest.Add(6L) : digest;
        digest = set.ConcentricSeconds is { } seconds ? digest.Add(7L).Add(seconds) : digest;
        return set.BarSpeedMetresPerSecond is { } speed ? digest.Add(8L).Add(speed) : digest;
    }
}
