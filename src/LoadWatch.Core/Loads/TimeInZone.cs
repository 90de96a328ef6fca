using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>Seconds spent in each zone of one channel.</summary>
/// <param name="Basis">What the bounds are, in words: <c>percent of heart-rate reserve</c>, <c>ventilatory thresholds</c>.</param>
/// <param name="Bounds">Inner bounds in the channel's unit, ascending, one fewer than zones; a value on a bound belongs to the zone
/// above.</param>
/// <param name="Seconds">Seconds by zone, lowest first; only samples with a usable reading count.</param>
/// <param name="Estimated">True when a bound rests on an estimated anchor.</param>
public sealed record TimeInZone(
    Channel Channel,
    string Basis,
    IReadOnlyList<double> Bounds,
    IReadOnlyList<double> Seconds,
    bool Estimated);
