using LoadWatch.Findings;

namespace LoadWatch.People;

/// <summary>A squad or class.</summary>
/// <param name="LoadQuantity">Name of the quantity that is this group's load, <c>banister_trimp</c> by default.</param>
public sealed record Group(string Id, string Name, string LoadQuantity, RuleLimits Limits);
