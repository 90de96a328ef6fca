using System.ComponentModel.DataAnnotations;
using System.Text.Json.Serialization;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>load_ratio</c>: acute load well above the usual, uncoupled.</summary>
public sealed record LoadRatioLimits : IDelayedLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Quantities that are watched beside the group's load, by name: built-in ones, or what a table states.</summary>
    public IReadOnlyList<string> Quantities { get; init; } = [];

    /// <summary>Raised at this uncoupled ratio or above. 2.2 uncoupled is 1.69 coupled, by algebra; the limit is fitted by simulation. Dimensionless.</summary>
    [Range(1.0, 10.0)]
    public double Raise { get; init; } = 2.2;

    /// <summary>Returns below this ratio. Fitted by simulation. Dimensionless.</summary>
    [Range(0.5, 10.0)]
    public double Return { get; init; } = 1.8;

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

    /// <summary>Raised only when the last 7 days exceed this multiple of the usual week too, where one is known: three light weeks are no usual to compare with. Fitted by simulation. Dimensionless.</summary>
    [Range(1.0, 5.0)]
    public double UsualFactor { get; init; } = 1.5;

    /// <summary>Dates in a row, of those that can be read, on which it must be so before it is raised. Fitted by simulation. Days.</summary>
    [Range(1, 14)]
    public int OnDays { get; init; } = 2;

    /// <summary>Dates in a row, of those that can be read, on which it must be so no more before it is over. A choice. Days.</summary>
    [Range(1, 14)]
    public int OffDays { get; init; } = 1;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Warning;
}
