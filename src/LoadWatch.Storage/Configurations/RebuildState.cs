namespace LoadWatch.Storage.Configurations;

/// <summary>Whether everything derived is being computed again.</summary>
public enum RebuildState
{
    None,

    /// <summary>By command, over the rows that stand: each stays until its successor is there.</summary>
    OverRows,

    /// <summary>The rows are gone or unreadable: nothing can be judged before they are back.</summary>
    FromNothing,
}
