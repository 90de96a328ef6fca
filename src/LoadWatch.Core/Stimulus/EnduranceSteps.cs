namespace LoadWatch.Stimulus;

/// <summary>What lies between the readings of power or speed and their estimate; times and what is left are those of the mid variant.</summary>
/// <param name="Limits">What they were read against.</param>
/// <param name="Variants">How each of the three takes it.</param>
/// <param name="LowestLeft">The least that was left of W', J, or of D', m; below 0 where more was spent than the reference value allows; null where every moment was
/// read as fresh.</param>
/// <param name="CriticalSeconds">Time at the critical value or above, s.</param>
/// <param name="HardSeconds">Time at <see cref="HardLine"/> or above, s; null without a true maximum.</param>
public sealed record EnduranceSteps(EnduranceLimits Limits, Variants Variants, double? LowestLeft, double CriticalSeconds, double? HardSeconds);
