using System.ComponentModel.DataAnnotations;
using System.Text.Json.Serialization;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>weekly_jump</c>: this week far above the last ordinary one. All a choice; the first four numbers and the delays are fitted by simulation.</summary>
public sealed record WeeklyJumpLimits : IDelayedLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Quantities that are watched beside the group's load, by name: built-in ones, or what a table states.</summary>
    public IReadOnlyList<string> Quantities { get; init; } = [];

    /// <summary>Raised when the last 7 days lie this fraction or more above the last ordinary week. Fraction, 0.3 is 30 % more.</summary>
    [Range(0.05, 5.0)]
    public double Raise { get; init; } = 0.2;

    /// <summary>Returns below this fraction. Fraction.</summary>
    [Range(0.0, 5.0)]
    public double Return { get; init; } = 0.1;

    /// <summary>Raised only when the last 7 days exceed the median of the ordinary weeks before by this factor too. Dimensionless.</summary>
    [Range(1.0, 5.0)]
    public double UsualFactor { get; init; } = 1.45;

    /// <summary>The same where no plan tells which sessions to expect: a session that left no recording cannot be told from rest there, and the weeks lie further apart. Dimensionless.</summary>
    [Range(1.0, 5.0)]
    public double UnplannedFactor { get; init; } = 1.6;

    /// <summary>Ordinary weeks of that median. Count.</summary>
    [Range(3, 12)]
    public int Weeks { get; init; } = 6;

    /// <summary>How far back they are looked for. Weeks.</summary>
    [Range(3, 52)]
    public int LookBackWeeks { get; init; } = 16;

    /// <summary>Days with known load wanted in each week. Days.</summary>
    [Range(5, 7)]
    [JsonPropertyName("covered_of_7")]
    public int CoveredOf7 { get; init; } = 5;

    /// <summary>Dates in a row, of those that can be read, on which it must be so before it is raised. Fitted by simulation. Days.</summary>
    [Range(1, 14)]
    public int OnDays { get; init; } = 1;

    /// <summary>Dates in a row, of those that can be read, on which it must be so no more before it is over. Fitted by simulation. Days.</summary>
    [Range(1, 14)]
    public int OffDays { get; init; } = 3;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
