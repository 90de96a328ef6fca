using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Whom to call this week.</summary>
/// <param name="Calls">Ten at most, by name.</param>
/// <param name="Beyond">Further people with a reason, count.</param>
public sealed record CallList(IReadOnlyList<Call> Calls, int Beyond);

/// <param name="LastSeen">Date of the last recording; null before any.</param>
/// <param name="Why">In words that the reader's role may see.</param>
public sealed record Call(string PersonId, string Name, LocalDate? LastSeen, string Why);
