using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>monotony</c>: a heavy week without variation.</summary>
public sealed record MonotonyLimits : IDelayedLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Raised above this monotony. A convention; no threshold is confirmed in Foster 1998. Dimensionless.</summary>
    [Range(1.0, 10.0)]
    public double Raise { get; init; } = 2;

    /// <summary>Returns below this monotony. A choice. Dimensionless.</summary>
    [Range(0.5, 10.0)]
    public double Return { get; init; } = 1.8;

    /// <summary>Raised only when the strain exceeds this quantile of the person's own strains. A choice. 0 to 1.</summary>
    [Range(0.5, 1.0)]
    public double StrainQuantile { get; init; } = 0.9;

    /// <summary>Dates with a known strain wanted for that quantile. A choice. Days.</summary>
    [Range(28, 365)]
    public int StrainsWanted { get; init; } = 60;

    /// <summary>How far back strains are looked at. A choice. Days.</summary>
    [Range(60, 400)]
    public int LookBackDays { get; init; } = 365;

    /// <summary>Dates in a row, of those that can be read, on which it must be so before it is raised. A choice. Days.</summary>
    [Range(1, 14)]
    public int OnDays { get; init; } = 1;

    /// <summary>Dates in a row, of those that can be read, on which it must be so no more before it is over. A choice. Days.</summary>
    [Range(1, 14)]
    public int OffDays { get; init; } = 1;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
