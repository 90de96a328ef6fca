using LoadWatch.Activities;

namespace LoadWatch.Loads;

/// <summary>The highest speed that was held for 1 s. Common practice, no published source.</summary>
public static class SpeedTop
{
    /// <summary>Metres per second, 0 or more; null where the readings do not stand for 1 s together.</summary>
    public static double? MetresPerSecond(UsableChannel speed) => SecondTop.Of(speed);
}
