using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>not_usable</c>: recordings came, but too little of them can be used. All a choice; the number of sessions is fitted by simulation.</summary>
public sealed record NotUsableLimits : IDelayedLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Sessions that raise it. Count.</summary>
    [Range(1, 20)]
    public int Sessions { get; init; } = 3;

    /// <summary>Over with so many of them, or fewer. Count.</summary>
    [Range(0, 19)]
    public int ReturnSessions { get; init; }

    /// <summary>Within so many days. Days.</summary>
    [Range(1, 28)]
    public int Days { get; init; } = 7;

    /// <summary>Share of the sampled time with a usable reading below which a channel is of no use. 0 to 1.</summary>
    [Range(0.05, 1.0)]
    public double UsableShare { get; init; } = 0.5;

    /// <summary>Dates in a row, of those that can be read, on which it must be so before it is raised. A choice. Days.</summary>
    [Range(1, 14)]
    public int OnDays { get; init; } = 1;

    /// <summary>Dates in a row, of those that can be read, on which it must be so no more before it is over. A choice. Days.</summary>
    [Range(1, 14)]
    public int OffDays { get; init; } = 1;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
