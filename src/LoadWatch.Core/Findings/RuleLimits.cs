using System.Text.Json.Serialization;

namespace LoadWatch.Findings;

/// <summary>The limits of the rules, each at its default. A group may set its own. Where a default was fitted, the tables are in tests/README.md.</summary>
public sealed record RuleLimits
{
    /// <summary>Acute load well above the usual.</summary>
    public LoadRatioLimits LoadRatio { get; init; } = new();

    /// <summary>This week far above the last ordinary one.</summary>
    public WeeklyJumpLimits WeeklyJump { get; init; } = new();

    /// <summary>One session far beyond the longest of the days before.</summary>
    public SessionSpikeLimits SessionSpike { get; init; } = new();

    /// <summary>A heavy week without variation.</summary>
    public MonotonyLimits Monotony { get; init; } = new();

    /// <summary>Too many hard days in a row, or too many matches close together.</summary>
    public HardDaysLimits HardDays { get; init; } = new();

    /// <summary>The usual load is fading.</summary>
    public FallingLoadLimits FallingLoad { get; init; } = new();

    /// <summary>Too long without heavy or fast work of a body region.</summary>
    public StimulusGapLimits StimulusGap { get; init; } = new();

    /// <summary>Too few heavy-or-fast days of a body region.</summary>
    public StimulusLowLimits StimulusLow { get; init; } = new();

    /// <summary>The best of the last weeks below the best before.</summary>
    public FallingCapacityLimits FallingCapacity { get; init; } = new();

    /// <summary>Expected recordings did not come.</summary>
    public SilenceLimits Silence { get; init; } = new();

    /// <summary>Recordings of too little quality.</summary>
    public NotUsableLimits NotUsable { get; init; } = new();

    /// <summary>Function tests beyond a published cut-off or down by more than their error.</summary>
    public FunctionTestLimits FunctionTest { get; init; } = new();

    /// <summary>Function tests that were not done again in time.</summary>
    public TestOverdueLimits TestOverdue { get; init; } = new();

    /// <summary>
    /// What a clinic's visits are not about is off. With two visits a week, of which one in seven is missing, a week's load lies as far from the usual by chance as by
    /// doubling; even weeks and days in a row mean little there.
    /// </summary>
    public static RuleLimits OfClinic() => new()
    {
        LoadRatio = new() { Enabled = false },
        WeeklyJump = new() { Enabled = false },
        Monotony = new() { Enabled = false },
        HardDays = new() { Enabled = false },
    };

    /// <summary>Every quantity that some rule in force watches beside the group's load, each once, in ordinal order.</summary>
    [JsonIgnore]
    public IReadOnlyList<string> Quantities =>
    [
        .. Of(LoadRatio.Enabled, LoadRatio.Quantities)
            .Concat(Of(WeeklyJump.Enabled, WeeklyJump.Quantities))
            .Concat(Of(FallingLoad.Enabled, FallingLoad.Quantities))
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal),
    ];

    private static IReadOnlyList<string> Of(bool enabled, IReadOnlyList<string> quantities) => enabled ? quantities : [];
}
