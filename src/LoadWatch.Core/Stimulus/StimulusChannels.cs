namespace LoadWatch.Stimulus;

/// <summary>The words for what a stimulus was read from.</summary>
public static class StimulusChannels
{
    public const string Power = "power";
    public const string Sets = "sets";
    public const string HeartRate = "heart_rate";

    /// <summary>Nothing could tell: every figure is unknown.</summary>
    public const string None = "none";
}
