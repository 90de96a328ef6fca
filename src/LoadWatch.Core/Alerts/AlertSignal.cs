namespace LoadWatch.Alerts;

/// <summary>What can happen to an alert.</summary>
public enum AlertSignal
{
    /// <summary>The finding holds.</summary>
    Raise,

    /// <summary>The finding asks for more than before.</summary>
    SeverityRise,

    /// <summary>The finding asks for less than before.</summary>
    SeverityFall,

    /// <summary>Somebody confirms having seen it.</summary>
    Acknowledge,

    /// <summary>The finding holds no more.</summary>
    Return,

    /// <summary>The finding turns out not to have held when it was judged (I-14).</summary>
    Correct,

    /// <summary>The finding holds no more by limits that were changed.</summary>
    ChangeLimits,

    /// <summary>The finding would hold, but plan or answers turn its rule off.</summary>
    Suppress,

    /// <summary>The finding holds, and its rule is no longer turned off.</summary>
    Resume,

    /// <summary>Plan or answers turn its rule off, and nothing tells that the finding would hold.</summary>
    Mute,

    /// <summary>The limits in force switch its rule off.</summary>
    TakeOut,
}
