using NodaTime;

namespace LoadWatch.Notices;

/// <summary>The last seven days beside the seven before, for a reader who looks once a week.</summary>
/// <param name="Groups">In the order of the contact.</param>
/// <param name="Standing">Alerts that nobody acknowledged for more than 14 days, by name, ten at most.</param>
/// <param name="Lost">People with half as many heavy-or-fast leg days as in the four weeks before, or fewer; by name, ten at most.</param>
public sealed record BriefWeek(
    LocalDate From, LocalDate To, IReadOnlyList<WeekOfGroup> Groups, IReadOnlyList<BriefLine> Standing, int StandingBeyond, IReadOnlyList<BriefLine> Lost, int LostBeyond);

/// <param name="Sentences">Load, recorded days, leg work, and how much of it is known.</param>
public sealed record WeekOfGroup(string Name, IReadOnlyList<string> Sentences);
