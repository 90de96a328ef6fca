using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>falling_load</c>: the usual load is fading. All a choice; 0.34 has a basis in studies of reduced volume, the notice and its delay are fitted by simulation.</summary>
public sealed record FallingLoadLimits : IDelayedLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Quantities that are watched beside the group's load, by name: built-in ones, or what a table states.</summary>
    public IReadOnlyList<string> Quantities { get; init; } = [];

    /// <summary>A notice under this share of the usual week. Share.</summary>
    [Range(0.1, 0.95)]
    public double Notice { get; init; } = 0.55;

    /// <summary>A warning under this share of the usual week. Share.</summary>
    [Range(0.0, 0.95)]
    public double Warning { get; init; } = 0.34;

    /// <summary>Returns at this share of the usual week or above. Share.</summary>
    [Range(0.1, 1.0)]
    public double Return { get; init; } = 0.7;

    /// <summary>Length of the stretch whose mean week is compared. Fitted by simulation. Days.</summary>
    [Range(14, 42)]
    public int Days { get; init; } = 21;

    /// <summary>Share of its days with known load that is wanted. A choice. 0 to 1.</summary>
    [Range(0.5, 1.0)]
    public double CoveredShare { get; init; } = 0.7;

    /// <summary>The same in whole days.</summary>
    internal int KnownWanted => (int)Math.Ceiling(Significant.Round(CoveredShare * Days));

    /// <summary>Weeks before those days that make the usual. Weeks.</summary>
    [Range(4, 12)]
    public int Weeks { get; init; } = 8;

    /// <summary>Ordinary weeks wanted among them. Weeks.</summary>
    [Range(3, 12)]
    public int WeeksWanted { get; init; } = 6;

    /// <summary>Dates in a row, of those that can be read, on which it must be so before it is raised. Fitted by simulation. Days.</summary>
    [Range(1, 14)]
    public int OnDays { get; init; } = 3;

    /// <summary>Dates in a row, of those that can be read, on which it must be so no more before it is over. A choice. Days.</summary>
    [Range(1, 14)]
    public int OffDays { get; init; } = 1;
}
