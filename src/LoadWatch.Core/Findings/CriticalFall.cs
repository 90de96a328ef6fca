// Critical power, or speed, of two stretches of weeks (Monod and Scherrer 1965; Moritani et al. 1981), and whether the bests of the later one look as hard-won as those of
// the earlier one. Power alone cannot tell a fall from holding back. So a fall is believed only where
// 1. both stretches have bests that may have been all out (TrialChoice), and their shortest and longest durations differ by a factor of 2 at most: the line through longer
//    efforts has the lower slope, whoever rides it;
// 2. the reserve (W', D') is not above the one before by more than the combined error: short efforts as good as ever beside poorer long ones are long efforts held back;
// 3. heart rate is known in the sessions of at least 3 trials of each stretch, and was not lower by more than 2 bpm at the same durations: efforts that are all held back by the
//    same share lie on a line as well, and nothing else tells them from a fall;
// 4. the value of late reaches 80 % of the one before, as AnchorContradiction wants it of a measured one: nobody who trains loses more in weeks.
// The numbers are choices, that of heart rate after invented seasons (tests/README.md). In deep fatigue, under drugs that slow the heart and without a strap a true fall stays
// untold.
using System.Globalization;
using LoadWatch.Anchors;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Critical power, or speed, of two stretches.</summary>
/// <param name="Sport">The kind of movement.</param>
/// <param name="Late">The last stretch.</param>
/// <param name="Early">The stretch before.</param>
/// <param name="HeartRateBelowBpm">How far heart rate lay below that before at the same durations, bpm; below 0 where it lay above; null where unknown.</param>
public sealed record CriticalFall(string Sport, CriticalStretch Late, CriticalStretch Early, double? HeartRateBelowBpm)
{
    public const double AlikeSpan = 2;
    public const double HeartRateWithinBpm = 2;

    /// <summary>Below 0 where it rose. Percent of the value before.</summary>
    public double Percent => Significant.Round((1 - (Late.Critical / Early.Critical)) * 100);

    /// <summary>Of the difference, in the unit of the values, above 0.</summary>
    public double CombinedError => Significant.Round(Math.Sqrt((Late.CriticalError * Late.CriticalError) + (Early.CriticalError * Early.CriticalError)));

    /// <summary>The larger of a percentage and a number of combined standard errors: a fall passes both above it. Percent of the value before.</summary>
    public double LimitPercent(FallingCapacityLimits limits) =>
        Significant.Round(Math.Max(limits.CriticalPercent, limits.CriticalErrors * CombinedError / Early.Critical * 100));

    /// <summary>Whether the fall is beyond its limit.</summary>
    public bool Raises(FallingCapacityLimits limits) => Percent > LimitPercent(limits);

    /// <summary>Whether a fall that was told goes on.</summary>
    public bool Holds(FallingCapacityLimits limits) => Percent > Significant.Round(limits.ReturnShare * LimitPercent(limits));

    /// <summary>Why bests of late do not look as hard-won as those before; null where they do.</summary>
    public string? HeldBack(CriticalQuantity quantity)
    {
        if (!AreAlike(Late.LongestSeconds, Early.LongestSeconds) || !AreAlike(Late.ShortestSeconds, Early.ShortestSeconds))
        {
            return $"the bests of late last {Late.Span}, those before {Early.Span}: too unlike to compare";
        }

        var reserveError = Math.Sqrt((Late.ReserveError * Late.ReserveError) + (Early.ReserveError * Early.ReserveError));
        if (Late.Reserve - Early.Reserve > reserveError)
        {
            return $"{quantity.ReserveWord} reads {quantity.Reserve(Late.Reserve)} of late, {quantity.Reserve(Early.Reserve)} before: short efforts were as good, long ones hardly all out";
        }

        if (Late.Critical < AnchorContradiction.ReachWanted * Early.Critical)
        {
            return $"{quantity.Value(Late.Critical)} of late is under 80 % of {quantity.Value(Early.Critical)} before: that is no hard work, not a loss";
        }

        return HeartRateBelowBpm switch
        {
            null => "heart rate is not known in 3 bests of each stretch, so holding back cannot be told from a loss",
            > HeartRateWithinBpm => $"heart rate in the bests of late was {HeartRateBelowBpm.Value.ToString("0.#", CultureInfo.InvariantCulture)} bpm below that before: they were hardly as hard",
            _ => null,
        };
    }

    private static bool AreAlike(double one, double other) => Math.Max(one, other) <= AlikeSpan * Math.Min(one, other);
}

/// <summary>What the bests of a stretch of dates tell. Numbers are rounded to 9 significant digits.</summary>
/// <param name="First">Its first date.</param>
/// <param name="Last">Its last date.</param>
/// <param name="Critical">Critical power, W, or critical speed, m/s.</param>
/// <param name="CriticalError">Its standard error, likewise.</param>
/// <param name="Reserve">W', J, or D', m.</param>
/// <param name="ReserveError">Its standard error, likewise.</param>
/// <param name="Trials">Bests that may have been all out.</param>
/// <param name="Sessions">Of so many sessions.</param>
public sealed record CriticalStretch(
    LocalDate First,
    LocalDate Last,
    double Critical,
    double CriticalError,
    double Reserve,
    double ReserveError,
    int Trials,
    int Sessions,
    double ShortestSeconds,
    double LongestSeconds)
{
    /// <summary><c>120 to 720 s</c>.</summary>
    internal string Span => string.Create(CultureInfo.InvariantCulture, $"{ShortestSeconds:0} to {LongestSeconds:0} s");
}
