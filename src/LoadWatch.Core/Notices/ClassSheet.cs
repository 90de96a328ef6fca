namespace LoadWatch.Notices;

/// <summary>One planned session of today, for a sheet of paper.</summary>
/// <param name="Heading">Group, kind and time: <c>Seniors, class from 10:00 to 11:00</c>.</param>
/// <param name="People">By name.</param>
public sealed record ClassSheet(string Heading, IReadOnlyList<ClassPerson> People);

/// <param name="Note">In few words that the reader's role may see; null where there is nothing to mind.</param>
/// <param name="IsAway">Planned, and said to be away.</param>
public sealed record ClassPerson(string PersonId, string Name, string? Note, bool IsAway)
{
    /// <summary>How much load the user's limits leave for today, in words; null where that is not told.</summary>
    public string? Room { get; init; }
}
