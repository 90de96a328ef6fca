namespace LoadWatch.Stimulus;

/// <summary>
/// What can be given at most at a moment. Source: Morton 1996, A 3-parameter critical power model, Ergonomics
/// 39:611-619. Symbols: CP critical power, W; W' work above it, J; Pmax maximal power, W. The same holds of critical speed, D' and maximal speed.
/// </summary>
public static class AvailablePower
{
    /// <summary>CP + (Pmax - CP) W'bal / W', W.</summary>
    /// <param name="balance">W'bal / W', 1 when fresh; 0 or less when exhausted: then critical power is all that is left.</param>
    public static double Watts(double criticalWatts, double maximumWatts, double balance) =>
        criticalWatts + ((maximumWatts - criticalWatts) * Math.Clamp(balance, 0, 1));
}
