namespace LoadWatch.Stimulus;

/// <summary>The part of the body that work went through. Legs first.</summary>
public enum BodyRegion
{
    Legs,
    Trunk,
    Arms,
}

/// <summary>How well a figure could be seen, A best; recruitment estimator, grades by channel.</summary>
public enum Grade
{
    /// <summary>Demand and maximum measured.</summary>
    A,

    /// <summary>One of them estimated from own bests, or a lower bound of a logged set.</summary>
    B,

    /// <summary>Inferred.</summary>
    C,

    /// <summary>Lower bound, declared, or without load.</summary>
    D,

    /// <summary>Heart rate only: bouts unknown, never none.</summary>
    E,
}

/// <summary>An estimate with its band, low at most mid at most high.</summary>
public readonly record struct Band(double Low, double Mid, double High);

/// <summary>What one session asked of each class of motor unit in one body region, estimated, never measured. Null is unknown, never
/// none.</summary>
/// <param name="Region">The body region.</param>
/// <param name="Grade">Of the best channel that saw it.</param>
/// <param name="Channel">What it was read from, a word of <see cref="StimulusChannels"/>; <c>none</c> where every figure is
/// unknown.</param>
/// <param name="HardBouts">Contiguous stretches of at least 3 s at a relative drive of 0.70 or more, count, of endurance channels and holds; null
/// for sets without a hold, where the channel cannot tell, or where no true maximum is known.</param>
/// <param name="HardRepetitions">Repetitions at a relative drive of 0.70 or more, count, of sets, 0 where every set was a hold; null for endurance
/// channels or where no set could be read.</param>
/// <param name="HardSets">Sets with at least one hard repetition, and holds with their hard bout (mid value), count.</param>
/// <param name="SlowSeconds">Recruited fraction of the slow class summed over time, s.</param>
/// <param name="MediumSeconds">The same for the medium (fatigue-resistant fast) class, s.</param>
/// <param name="LargeSeconds">The same for the largest (fast-twitch) class, s.</param>
/// <param name="NotSeen">What would have to be known, or was not seen, in plain words; empty when nothing.</param>
public sealed record RegionStimulus(
    BodyRegion Region,
    Grade Grade,
    string Channel,
    Band? HardBouts,
    Band? HardRepetitions,
    int? HardSets,
    Band? SlowSeconds,
    Band? MediumSeconds,
    Band? LargeSeconds,
    IReadOnlyList<string> NotSeen)
{
    /// <summary>Whether the figures could tell hard work, or that there was none.</summary>
    public bool SeesHardWork => HardBouts.HasValue || HardRepetitions.HasValue;
}
