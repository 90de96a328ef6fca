namespace LoadWatch.Service.Demo;

/// <summary>What happens to a person of the demo.</summary>
public enum DemoPlot
{
    /// <summary>Trains as usual to the end.</summary>
    Usual,

    /// <summary>Two sessions a day in the last week.</summary>
    RampUp,

    /// <summary>Rows easy for the last two weeks and more: nothing heavy, nothing fast.</summary>
    EasyOnly,

    /// <summary>The strap gives 0 for the last three weeks; power is still there.</summary>
    StrapFailed,

    /// <summary>Nothing came for nine days.</summary>
    SilentNineDays,

    /// <summary>Nothing came for two weeks.</summary>
    SilentTwoWeeks,

    /// <summary>No leg work for nearly four weeks.</summary>
    ArmsForWeeks,

    /// <summary>No leg work for nearly two weeks.</summary>
    ArmsForDays,
}
