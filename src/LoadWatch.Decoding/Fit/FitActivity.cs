using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Fit;

/// <summary>One activity to be written as a FIT file. FIT keeps whole seconds.</summary>
public sealed record FitActivity
{
    /// <summary>The number under which makers in development write.</summary>
    public const int Development = 255;

    public required Instant Start { get; init; }

    /// <summary>In the words of the FIT profile.</summary>
    public Sport Sport { get; init; } = Sport.Generic;

    public Device Device { get; init; } = new(Development, Product: 1, Serial: null);

    /// <summary>Local time minus UTC; null leaves it unstated.</summary>
    public Offset? LocalOffset { get; init; }

    /// <summary>Total in seconds; null: until the last sample.</summary>
    public double? ElapsedSeconds { get; init; }

    /// <summary>Seconds the timer ran; null: elapsed without the pauses.</summary>
    public double? TimerSeconds { get; init; }

    /// <summary>In time order.</summary>
    public IReadOnlyList<FitSample> Samples { get; init; } = [];

    /// <summary>In time order.</summary>
    public IReadOnlyList<Pause> Pauses { get; init; } = [];

    public IReadOnlyList<StrengthSet> Sets { get; init; } = [];

    /// <summary>Where laps begin, in time order; empty: one lap.</summary>
    public IReadOnlyList<Instant> LapStarts { get; init; } = [];

    internal double Elapsed => ElapsedSeconds ?? (Samples.Count > 0 ? (Samples[^1].Time - Start).TotalSeconds : 0);

    internal Instant End => Start + Duration.FromSeconds(Elapsed);

    internal double Timer => TimerSeconds ?? Elapsed - Pauses.Sum(pause => ((pause.End ?? End) - pause.Start).TotalSeconds);
}

/// <summary>One record of an activity; null where nothing was measured. Units are those of <see cref="Channel"/>.</summary>
public readonly record struct FitSample(
    Instant Time,
    int? HeartRate = null,
    int? Power = null,
    double? Speed = null,
    int? Cadence = null,
    double? Distance = null,
    double? Altitude = null)
{
    internal double? this[Channel channel] => channel switch
    {
        Channel.HeartRate => HeartRate,
        Channel.Power => Power,
        Channel.Speed => Speed,
        Channel.Cadence => Cadence,
        Channel.Distance => Distance,
        _ => Altitude,
    };
}
