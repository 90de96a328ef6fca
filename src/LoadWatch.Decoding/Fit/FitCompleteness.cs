namespace LoadWatch.Decoding.Fit;

/// <summary>What the bytes of a FIT file say about themselves.</summary>
public enum FitCompleteness
{
    /// <summary>Whole parts with right checksums, and nothing behind them.</summary>
    Complete,

    /// <summary>Anything else: more may still come, or the file is damaged.</summary>
    Suspect,
}
