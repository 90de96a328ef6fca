namespace LoadWatch.Service.Demo;

/// <summary>What happens to a person of the demo.</summary>
public enum DemoPlot
{
    /// <summary>Trains as usual to the end.</summary>
    Usual,

    /// <summary>Two sessions a day in the last week.</summary>
    RampUp,

    /// <summary>Rows easy and leaves out the gym for the last two weeks and more: nothing heavy, nothing fast. The coach has seen it.</summary>
    EasyOnly,

    /// <summary>The strap gives 0 for the last three weeks; power is still there.</summary>
    StrapFailed,

    /// <summary>One row of more than two hours, with planned days off before and after it.</summary>
    LongRow,

    /// <summary>Nothing came for thirteen days.</summary>
    SilentThirteenDays,

    /// <summary>On holiday for two weeks, and nobody was told.</summary>
    SilentTwoWeeks,

    /// <summary>Away for some days, as staff were told.</summary>
    AwayAsTold,

    /// <summary>Ill for a week, back since, with shorter sessions.</summary>
    Ill,

    /// <summary>One session lay on the club's laptop, until the coach said whose it is.</summary>
    LeftOnLaptop,

    /// <summary>Grip strength fell below the published cut-off.</summary>
    WeakGrip,

    /// <summary>No leg work for more than three weeks.</summary>
    ArmsForWeeks,

    /// <summary>No leg work for about two weeks.</summary>
    ArmsForDays,
}
