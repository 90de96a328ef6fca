using System.ComponentModel.DataAnnotations;
using System.Text.Json.Serialization;

namespace LoadWatch.Findings;

/// <summary>The limits of the rules, each at its default. A group may set its own.</summary>
public sealed record RuleLimits
{
    /// <summary>Acute load well above the usual.</summary>
    public LoadRatioLimits LoadRatio { get; init; } = new();

    /// <summary>Too long without heavy or fast work of a body region.</summary>
    public StimulusGapLimits StimulusGap { get; init; } = new();

    /// <summary>Expected recordings did not come.</summary>
    public SilenceLimits Silence { get; init; } = new();

    /// <summary>Too few heavy-or-fast days of a body region.</summary>
    public StimulusLowLimits StimulusLow { get; init; } = new();

    /// <summary>The best of the last weeks below the best before.</summary>
    public FallingCapacityLimits FallingCapacity { get; init; } = new();

    /// <summary>Recordings of too little quality.</summary>
    public NotUsableLimits NotUsable { get; init; } = new();

    /// <summary>Function tests beyond a published cut-off or down by more than their error.</summary>
    public FunctionTestLimits FunctionTest { get; init; } = new();
}

/// <summary>Limits of the rule <c>load_ratio</c>: acute load well above the usual, uncoupled.</summary>
public sealed record LoadRatioLimits
{
    /// <summary>Raised at this uncoupled ratio or above. 1.8 uncoupled is 1.5 coupled, by algebra; the limit is a choice. Dimensionless.</summary>
    [Range(1.0, 10.0)]
    public double Raise { get; init; } = 1.8;

    /// <summary>Returns below this ratio. A choice. Dimensionless.</summary>
    [Range(0.5, 10.0)]
    public double Return { get; init; } = 1.6;

    /// <summary>The first covered day lies at least this many days back. A choice. Days.</summary>
    [Range(28, 365)]
    public int HistoryDays { get; init; } = 28;

    /// <summary>Days with known load wanted among the last 7. A choice. Days.</summary>
    [Range(5, 7)]
    [JsonPropertyName("covered_of_7")]
    public int CoveredOf7 { get; init; } = 5;

    /// <summary>Days with known load wanted among the last 28. A choice. Days.</summary>
    [Range(22, 28)]
    [JsonPropertyName("covered_of_28")]
    public int CoveredOf28 { get; init; } = 22;

    /// <summary>The chronic load must exceed this share of its own median over 12 months: no ratio over a near-empty month. A choice. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double ChronicShareOfMedian { get; init; } = 0.4;
}

/// <summary>Limits of the rule <c>stimulus_gap</c>: too long without heavy or fast work of a body region. All a choice.</summary>
public sealed record StimulusGapLimits
{
    /// <summary>Days without heavy or fast work that raise a notice. Days.</summary>
    [Range(2, 120)]
    public int NoticeDays { get; init; } = 10;

    /// <summary>Under <see cref="OlderFrom"/>: days that raise a warning. Days.</summary>
    [Range(2, 180)]
    public int WarningDays { get; init; } = 14;

    /// <summary>Age from which the person's own usual gap counts. Years.</summary>
    [Range(40, 100)]
    public int OlderFrom { get; init; } = 60;

    /// <summary>From <see cref="OlderFrom"/>: the notice comes at this multiple of the usual gap, if later. Dimensionless.</summary>
    [Range(1.0, 5.0)]
    public double OlderUsualGapFactor { get; init; } = 2;

    /// <summary>From <see cref="OlderFrom"/>: days that raise a warning at the earliest. Days.</summary>
    [Range(2, 180)]
    public int OlderWarningDays { get; init; } = 21;

    /// <summary>From <see cref="OlderFrom"/>: days from notice to warning at the least. Days.</summary>
    [Range(1, 60)]
    public int OlderWarningAfterNoticeDays { get; init; } = 7;

    /// <summary>Share of the gap's days on which the region's stimulus was known; below it nothing is raised. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double CoveredShare { get; init; } = 0.7;

    /// <summary>Whether enough of the days of a gap are known.</summary>
    public bool KnownEnough(int knownDays, int days) => knownDays >= Significant.Round(CoveredShare * days);
}

/// <summary>Limits of the rule <c>silence</c>: expected recordings did not come, by the rhythm of the person's own recordings. All a choice.</summary>
public sealed record SilenceLimits
{
    /// <summary>Quantile of the person's own gaps between recorded days. 0 to 1.</summary>
    [Range(0.5, 1.0)]
    public double GapQuantile { get; init; } = 0.9;

    /// <summary>Days beyond that quantile. Days.</summary>
    [Range(0, 30)]
    public int ExtraDays { get; init; } = 2;

    /// <summary>Gaps wanted before a rhythm counts as known. Count.</summary>
    [Range(3, 100)]
    public int GapsWanted { get; init; } = 6;

    /// <summary>How far back gaps are looked at. Days.</summary>
    [Range(28, 400)]
    public int LookBackDays { get; init; } = 84;

    /// <summary>Where the plan expects recordings: planned sessions in a row without one. Count.</summary>
    [Range(1, 20)]
    public int PlannedMissed { get; init; } = 2;

    /// <summary>Days that a recording of a planned session may take to come in. Days.</summary>
    [Range(0, 14)]
    public int PlannedWaitDays { get; init; } = 2;

    /// <summary>Longer than this is silence whatever the person's own gaps were. Days.</summary>
    [Range(7, 400)]
    public int CeilingDays { get; init; } = 42;
}
