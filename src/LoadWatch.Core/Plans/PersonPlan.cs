using NodaTime;

namespace LoadWatch.Plans;

/// <summary>Everything that plan, day tables and answers say about one person, asked for by date. Pure.</summary>
public sealed class PersonPlan
{
    /// <summary>Length of the return phase, days. A choice.</summary>
    public const int ReturnDays = 14;

    /// <summary>An absence of this length or longer is a break that one returns from, days. A choice.</summary>
    public const int BreakDays = 7;

    public static PersonPlan None { get; } = new() { Entries = [] };

    /// <summary>Lines of the plan of the person or the person's group, matches by answer among them.</summary>
    public required IReadOnlyList<PlanEntry> Entries { get; init; }

    /// <summary>By answer, command or day table; an open one already closed where the return was told.</summary>
    public IReadOnlyList<Absence> Absences { get; init; } = [];

    /// <summary>Dates on which the person trains again, as told.</summary>
    public IReadOnlyList<LocalDate> Returns { get; init; } = [];

    /// <summary>Dates of stated rest with who stated it (<c>answers</c>, <c>days</c>); rest of the plan is among the entries.</summary>
    public IReadOnlyDictionary<LocalDate, string> Rests { get; init; } = new Dictionary<LocalDate, string>();

    /// <summary>Dates on which the person was there (true) or was missed (false), by day table.</summary>
    public IReadOnlyDictionary<LocalDate, bool> Attendance { get; init; } = new Dictionary<LocalDate, bool>();
}
