namespace LoadWatch.Recordings;

/// <summary>How the load of a set was made.</summary>
public enum SetLoad
{
    /// <summary>Free weight or a stack marked in kilograms.</summary>
    Weight,

    /// <summary>A stack whose plates carry numbers; its kilograms are known only where they are stated too.</summary>
    Pin,

    /// <summary>The body's own weight; kilograms hang on it in addition.</summary>
    BodyWeight,

    /// <summary>Elastic; its pull changes along the way.</summary>
    Band,
}
