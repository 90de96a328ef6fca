namespace LoadWatch.Stimulus;

/// <summary>The words for what a stimulus was read from.</summary>
public static class StimulusChannels
{
    public const string Power = "power";

    /// <summary>Running speed.</summary>
    public const string Speed = "speed";
    public const string Sets = "sets";
    public const string HeartRate = "heart_rate";

    /// <summary>Nothing but a statement of staff.</summary>
    public const string Declared = "declared";

    /// <summary>Nothing could tell: every figure is unknown.</summary>
    public const string None = "none";
}
