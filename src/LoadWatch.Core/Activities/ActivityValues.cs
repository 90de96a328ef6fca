using LoadWatch.Capacity;
using LoadWatch.Loads;
using LoadWatch.Quality;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;

namespace LoadWatch.Activities;

/// <summary>Everything computed from one recording of one person. Unknown is null or absent, never 0.</summary>
public sealed record ActivityValues
{
    /// <summary>Time-weighted mean over usable readings, bpm.</summary>
    public double? HeartRateMeanBpm { get; init; }

    public int? HeartRateMaxBpm { get; init; }

    /// <summary>Time-weighted mean over usable readings, zeros included, watts.</summary>
    public double? PowerMeanWatts { get; init; }

    public double? PowerMaxWatts { get; init; }

    /// <summary>Share of the sampled time with a usable reading, 0 to 1, for each channel that the recording holds.</summary>
    public IReadOnlyDictionary<Channel, double> UsableShare { get; init; } = new Dictionary<Channel, double>();

    /// <summary>What of the recording does not count, where, and why: whole rows and time without rows first, then by channel, reason and time.</summary>
    public IReadOnlyList<Cut> Cuts { get; init; } = [];

    /// <summary>Of heart rate, power and speed, where usable.</summary>
    public IReadOnlyDictionary<Channel, Histogram> Histograms { get; init; } = new Dictionary<Channel, Histogram>();

    /// <summary>Of heart rate, power and speed, where usable; of heart rate also what lies above the person's maximum.</summary>
    public IReadOnlyDictionary<Channel, BestMeans> BestMeans { get; init; } = new Dictionary<Channel, BestMeans>();

    /// <summary>Of heart rate, power and speed, where the bounds are known.</summary>
    public IReadOnlyList<TimeInZone> TimesInZone { get; init; } = [];

    /// <summary>Every quantity that could be computed, sorted by name.</summary>
    public IReadOnlyList<Quantity> Quantities { get; init; } = [];

    /// <summary>One entry per body region that the session went through, legs first.</summary>
    public IReadOnlyList<RegionStimulus> Stimulus { get; init; } = [];

    /// <summary>Why something is unknown, in plain words: <c>heart rate usable in 12 % of the time: no heart-rate load</c>.</summary>
    public IReadOnlyList<string> Remarks { get; init; } = [];
}
