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
}
