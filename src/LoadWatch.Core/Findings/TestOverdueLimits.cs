using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>test_overdue</c>: a function test was not done again in time. All a choice.</summary>
public sealed record TestOverdueLimits : IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Days from a test to the next of its kind. Days.</summary>
    [Range(14, 1000)]
    public int IntervalDays { get; init; } = 365;

    /// <summary>Tests, by their words, that everybody is to have: who never had one is told after the interval, counted from the first day known. Others are watched from the first one on.</summary>
    public IReadOnlyList<string> Tests { get; init; } = [];

    /// <summary>As what it is raised.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
